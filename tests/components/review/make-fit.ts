import { fitSchema, type Fit } from '@/lib/schemas/fit';

type FitParameter = Fit['answer']['parameters'][number];
type Changes = Partial<Omit<Fit, 'spec' | 'answer' | 'hashes'>> & {
  spec?: Partial<Fit['spec']>;
  answer?: Partial<Fit['answer']>;
  hashes?: Partial<Fit['hashes']>;
};

let made = 0;
const uuid = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const SCAN = uuid(900_001);
const SAMPLE = uuid(900_002);
const SET = uuid(900_003);
const PERSON = uuid(900_004);
const ENERGIES = [2, 6, 10, 14, 18];

export function makeParameter(
  name: FitParameter['name'],
  value: number,
  half: number,
  changes: Partial<FitParameter> = {},
): FitParameter {
  return {
    name,
    value,
    sigma: half,
    interval68: [value - half, value + half],
    interval95: [value - 1.96 * half, value + 1.96 * half],
    held: false,
    atBound: null,
    symmetric: true,
    ...changes,
  };
}

/** A small, whole fit that passes the product's own schema; invented numbers. */
export function makeFit(changes: Changes = {}): Fit {
  made += 1;
  const profile = changes.spec?.profile ?? 'graded';
  const edge = makeParameter('edgeDepthNm', 78.4, 2);
  const width = makeParameter('edgeWidthNm', 9.6, 2.4);
  const { spec, answer, hashes, ...rest } = changes;
  const parameters = [
    edge,
    ...(profile === 'graded' ? [width] : []),
    makeParameter('levelTop', 0.742, 0.004),
    makeParameter('levelBulk', 0.318, 0.011),
  ];
  const points = ENERGIES.map((energyKeV) => ({
    energyKeV,
    value: 0.5,
    sigma: 0.01,
    enabled: true,
  }));
  return fitSchema.parse({
    id: uuid(made),
    name: `Fit ${made}`,
    state: 'submitted',
    sampleId: SAMPLE,
    sampleName: 'Wafer 1',
    scanId: SCAN,
    scanName: 'Dark scan',
    stoppingSetId: SET,
    stoppingSetName: 'Oxide on silicon carbide',
    profile,
    edge,
    width: profile === 'graded' ? width : null,
    chiSquare: 1.2,
    degreesOfFreedom: 1,
    aicc: 20,
    createdBy: 'Ana Lyst',
    createdById: PERSON,
    createdAt: '2026-03-01T09:00:00.000Z',
    invented: true,
    issuedProfileId: null,
    issuedNumber: null,
    notes: '',
    parent: null,
    observable: 'fraction',
    spec: {
      profile,
      polarity: 'depletion',
      response: { kind: 'two-level' },
      carriers: { bulkPerCm3: 1.1e16, bulkSigmaPerCm3: 4e14, topPerCm3: null },
      capThicknessNm: 0,
      parameters: {},
      switchedOffKeV: [],
      seed: 1,
      resamples: 2000,
      ...spec,
    },
    points,
    answer: {
      status: 'converged',
      parameters,
      chiSquare: 1.2,
      dataChiSquare: 1.2,
      degreesOfFreedom: 1,
      pValue: 0.27,
      freeParameters: parameters.length,
      aicc: 20,
      bic: 7.6,
      covariance: { ok: false, reason: 'left out of this test' },
      residuals: points.map(({ energyKeV }) => ({
        energyKeV,
        observed: 0.5,
        sigma: 0.01,
        predicted: 0.5,
        reduced: 0,
        enabled: !(spec?.switchedOffKeV ?? []).includes(energyKeV),
        interpolated: false,
      })),
      evidence: { folds: 100, starts: 3, iterations: 20, predictedReduction: 0 },
      ...answer,
    },
    carrierProfile: {
      unit: 'cm⁻³',
      bands: 'bootstrap',
      points: [0, 40, 80, 120, 160].map((depthNm) => ({
        depthNm,
        value: depthNm < 78 ? 0 : 1.1e16,
        lower68: depthNm < 78 ? 0 : 1.0e16,
        upper68: depthNm < 78 ? 1e14 : 1.15e16,
        lower95: depthNm < 78 ? 0 : 0.9e16,
        upper95: depthNm < 78 ? 2e14 : 1.2e16,
        flag: depthNm > 140 ? 'beyond reach' : depthNm < 78 ? 'below floor' : 'supported',
      })),
      reachNm: 140,
      floor: 3e14,
    },
    checks: [
      {
        id: 'edge-inside-reach',
        state: 'fine',
        message: 'The edge is inside the reach of the scan.',
      },
    ],
    hashes: {
      points: 'a'.repeat(64),
      stoppingSet: 'b'.repeat(64),
      inputs: 'c'.repeat(64),
      ...hashes,
    },
    scanChangedSince: false,
    events: [],
    may: {
      submit: false,
      accept: false,
      return: false,
      comment: false,
      revise: false,
      discard: false,
    },
    ...rest,
  });
}
