import type {
  CarrierProfile,
  Check,
  FitAnswer,
  FitStatus,
  Interval,
  ParameterName,
  ProfileKind,
  ProfilePoint,
} from '@/lib/inversion/index';

/** What `--json` prints. */
export interface InvertReport {
  status: FitStatus;
  profile: { kind: ProfileKind; points: ProfilePoint[] };
  parameters: {
    name: ParameterName;
    value: number;
    sigma: number | null;
    interval68: Interval;
    interval95: Interval;
    held: boolean;
    atBound: boolean;
  }[];
  chiSquare: number;
  degreesOfFreedom: number;
  pValue: number | null;
  aicc: number | null;
  checks: Check[];
}

/** The answer in the shape that the command promises, field by field, so that nothing else slips in. */
export function reportOf(
  kind: ProfileKind,
  answer: FitAnswer,
  profile: CarrierProfile,
  checks: readonly Check[],
): InvertReport {
  return {
    status: answer.status,
    profile: { kind, points: profile.points.map((point) => pointOf(point, profile)) },
    parameters: answer.parameters.map(
      ({ name, value, sigma, interval68, interval95, held, atBound }) => ({
        name,
        value,
        sigma,
        interval68,
        interval95,
        held,
        atBound: atBound !== null,
      }),
    ),
    chiSquare: answer.chiSquare,
    degreesOfFreedom: answer.degreesOfFreedom,
    pValue: answer.pValue,
    aicc: answer.aicc,
    checks: checks.map(({ id, state, message }) => ({ id, state, message })),
  };
}

/** Only resampled bands are printed: without resamples there are none. */
function pointOf(point: ProfilePoint, { bands }: CarrierProfile): ProfilePoint {
  const { depthNm, value, flag } = point;
  if (bands !== 'bootstrap') {
    return { depthNm, value, lower68: null, upper68: null, lower95: null, upper95: null, flag };
  }
  const { lower68, upper68, lower95, upper95 } = point;
  return { depthNm, value, lower68, upper68, lower95, upper95, flag };
}
