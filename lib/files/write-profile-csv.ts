import type { CarrierProfile } from '@/lib/inversion/index';
import { csvText, type HeadLine } from './csv-text';

export interface ProfileCsvInput {
  /** Identity, citation, model, parameters, checks, licence of use, hashes: written first, in order. */
  head: readonly HeadLine[];
  profile: CarrierProfile;
  depthUnit: 'nm' | 'um' | 'cm';
  /** Without effect on a populated share, which has no unit. */
  concentrationUnit: 'cm-3' | 'm-3';
  /** The grid in words, such as "fit grid" or "uniform, 1 nm": the points are written as they are given. */
  grid: string;
}

const DEPTH_PER_NM = { nm: 1, um: 1e-3, cm: 1e-7 } as const;
const PER_CM3 = { 'cm-3': 1, 'm-3': 1e6 } as const;

/** A carrier profile as CSV: depth, value, 68 % and 95 % bounds, flag; units stand in the headings. */
export function profileCsv(input: ProfileCsvInput): string {
  const { profile, depthUnit } = input;
  const isShare = profile.unit === 'populated share';
  const scale = isShare ? 1 : PER_CM3[input.concentrationUnit];
  const value = (x: number | null) => (x === null ? null : x * scale);
  const unit = isShare ? '' : `_${input.concentrationUnit}`;
  const columns = [
    `depth_${depthUnit}`,
    isShare ? 'populated_share' : `concentration${unit}`,
    ...['lower68', 'upper68', 'lower95', 'upper95'].map((name) => `${name}${unit}`),
    'flag',
  ];
  const rows = profile.points.map((point) => [
    point.depthNm * DEPTH_PER_NM[depthUnit],
    ...[point.value, point.lower68, point.upper68, point.lower95, point.upper95].map(value),
    point.flag,
  ]);
  return csvText([...input.head, ...aboutTheColumns(input, isShare)], columns, rows);
}

function aboutTheColumns(
  { profile, depthUnit, concentrationUnit, grid }: ProfileCsvInput,
  isShare: boolean,
): HeadLine[] {
  const bands = { bootstrap: 'parametric bootstrap', delta: 'delta method' } as const;
  const reach = Number((profile.reachNm * DEPTH_PER_NM[depthUnit]).toPrecision(6));
  return [
    ['depth unit', `${depthUnit} below the semiconductor surface`],
    [
      'value',
      isShare
        ? 'populated share of the carriers, 0 to 1, without unit'
        : `concentration of carriers in ${concentrationUnit}`,
    ],
    ['grid', grid],
    ['bands', profile.bands ? `68 % and 95 %, ${bands[profile.bands]}, pointwise` : 'none'],
    ['reach', `${reach} ${depthUnit}; deeper points are flagged "beyond reach"`],
    [
      'carriers, not doping',
      'the value is that of carriers and never of doping; inside a depletion layer the two differ',
    ],
    [
      'caution',
      'a fitted profile is a model-dependent estimate, valid only within its reach; it does not replace process qualification',
    ],
  ];
}
