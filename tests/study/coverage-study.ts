/**
 * How often the intervals of the edge (of the surface potential, where bands bend), and the upper limit of its width, hold the
 * truth of simulated scans. Some minutes.
 *
 *   npm run coverage-study             a Markdown table
 *   npm run coverage-study -- --json   {"scans", "settings": [{"name", ...counts}]}
 *   npm run coverage-study -- 200      with so many scans a setting in place of 2,000
 */
import { coverageOf, type Coverage, type CoverageSetting } from '../inversion/support/coverage';
import {
  ENERGIES_KEV,
  fractionInput,
  freeWith,
  heldAt,
  rateInput,
} from '../inversion/support/scans';

const SCANS = 2000;

const sharp = { profile: 'sharp' } as const;
const scale = freeWith(1, 0.03);
const levels = { levelTop: 0.74, levelBulk: 0.32 };
const heldLevels = { levelTop: heldAt(levels.levelTop), levelBulk: heldAt(levels.levelBulk) };
const rates = { levelTop: 0.1, levelBulk: 2 };

/** Neighbours correlated by 0.44, all by at least 0.3. */
const correlated = (sigma: number): number[][] =>
  ENERGIES_KEV.map((_, i) =>
    ENERGIES_KEV.map((__, j) => sigma ** 2 * (0.3 + 0.7 * 0.2 ** Math.abs(i - j))),
  );

const carriersOf = (bulkPerCm3: number) => ({
  carriers: { bulkPerCm3, bulkSigmaPerCm3: null, topPerCm3: null },
});
/** Germanium at 290 K with 4e16 cm⁻³: a Debye length of 24 nm. */
const bent = {
  profile: 'band-bending',
  semiconductor: { relativePermittivity: 16, temperatureK: 290, intrinsicPerCm3: 2e13 },
  ...carriersOf(4e16),
} as const;
const bentTruth = { surfacePotentialEv: 0.25, bulkPerCm3: 4e16, levelTop: 0.01, levelBulk: 3 };

const SETTINGS: CoverageSetting[] = [
  {
    name: 'sharp, fraction, middle, σ 0.006',
    input: fractionInput(sharp, 0.006),
    truth: { edgeDepthNm: 75, ...levels },
  },
  {
    name: 'sharp, fraction, shallow, σ 0.02',
    input: fractionInput(sharp, 0.02),
    truth: { edgeDepthNm: 22, ...levels },
  },
  {
    name: 'sharp, fraction, near the reach, σ 0.01, prior on the bulk level',
    input: fractionInput({ ...sharp, parameters: { levelBulk: freeWith(0.32, 0.03) } }, 0.01),
    truth: { edgeDepthNm: 165, ...levels },
  },
  {
    name: 'sharp, rate, middle, σ 0.06, depth scale free',
    input: rateInput({ ...sharp, parameters: { depthScale: scale } }, 0.06),
    truth: { edgeDepthNm: 60, ...rates },
  },
  {
    name: 'graded, fraction, middle, σ 0.006',
    input: fractionInput({}, 0.006),
    truth: { edgeDepthNm: 75, edgeWidthNm: 18, ...levels },
  },
  {
    name: 'graded, fraction, middle, narrow, σ 0.006',
    input: fractionInput({}, 0.006),
    truth: { edgeDepthNm: 75, edgeWidthNm: 6, ...levels },
  },
  {
    name: 'graded, fraction, middle, σ 0.025',
    input: fractionInput({}, 0.025),
    truth: { edgeDepthNm: 75, edgeWidthNm: 18, ...levels },
  },
  {
    name: 'graded, fraction, shallow, σ 0.006',
    input: fractionInput({}, 0.006),
    truth: { edgeDepthNm: 25, edgeWidthNm: 8, ...levels },
  },
  {
    name: 'the same with both levels held',
    input: fractionInput({ parameters: heldLevels }, 0.006),
    truth: { edgeDepthNm: 25, edgeWidthNm: 8, ...levels },
  },
  {
    name: 'graded, fraction, near the reach, σ 0.006, prior on the bulk level',
    input: fractionInput({ parameters: { levelBulk: freeWith(0.32, 0.02) } }, 0.006),
    truth: { edgeDepthNm: 150, edgeWidthNm: 15, ...levels },
  },
  {
    name: 'graded, fraction, near the reach, σ 0.02, levels free',
    input: fractionInput({}, 0.02),
    truth: { edgeDepthNm: 150, edgeWidthNm: 15, ...levels },
  },
  {
    name: 'the same with both levels and the width held',
    input: fractionInput({ parameters: { ...heldLevels, edgeWidthNm: heldAt(15) } }, 0.02),
    truth: { edgeDepthNm: 150, edgeWidthNm: 15, ...levels },
  },
  {
    name: 'graded, rate, middle, σ 0.06, depth scale free, priors on both levels',
    input: rateInput(
      {
        parameters: {
          depthScale: scale,
          levelTop: freeWith(0.1, 0.02),
          levelBulk: freeWith(2, 0.1),
        },
      },
      0.06,
    ),
    truth: { edgeDepthNm: 70, edgeWidthNm: 16, ...rates },
    repeat: 10,
  },
  {
    name: 'graded, rate, no carriers in front, σ 0.06',
    input: rateInput({}, 0.06),
    truth: { edgeDepthNm: 60, edgeWidthNm: 14, levelTop: 0.01, levelBulk: 1.5 },
  },
  {
    name: 'graded, fraction, middle, σ 0.006, correlated points',
    input: fractionInput({ covariance: correlated(0.006) }, 0.006),
    truth: { edgeDepthNm: 75, edgeWidthNm: 18, ...levels },
  },
  {
    name: 'graded, saturating fraction, middle, σ 0.004',
    input: fractionInput(
      {
        response: { kind: 'saturating-fraction', halfPerCm3: 2e15, halfSigmaPerCm3: null },
        ...carriersOf(2e16),
      },
      0.004,
    ),
    truth: { edgeDepthNm: 80, edgeWidthNm: 20, ...levels },
  },
  {
    name: 'layer of 65 nm, rate, σ 0.03, far width held (near edge)',
    input: rateInput({ profile: 'layer', parameters: { farEdgeWidthNm: heldAt(12) } }, 0.03),
    truth: {
      edgeDepthNm: 45,
      edgeWidthNm: 14,
      layerThicknessNm: 65,
      farEdgeWidthNm: 12,
      levelTop: 0.1,
      levelBulk: 3,
    },
  },
  {
    name: 'band bending, rate, σ 0.05 (surface potential)',
    input: rateInput({ ...bent, parameters: { levelTop: heldAt(0.01) } }, 0.05),
    truth: bentTruth,
  },
  {
    name: 'band bending, rate, σ 0.05, prior on the bulk (surface potential)',
    input: rateInput(
      { ...bent, parameters: { levelTop: heldAt(0.01), bulkPerCm3: freeWith(4e16, 6e15) } },
      0.05,
    ),
    truth: bentTruth,
  },
];

/** Share of `of` in per cent with its binomial standard error. */
function percent(count: number, of: number): string {
  if (of === 0) return '';
  const share = count / of;
  return `${(100 * share).toFixed(1)} ± ${(100 * Math.sqrt((share * (1 - share)) / of)).toFixed(1)}`;
}

function tableRow(name: string, c: Coverage): string {
  const fitted = c.scans - c.noMinimum;
  const cells = [
    c.scans === scans ? name : `${name} (${c.scans.toLocaleString('en')} scans)`,
    percent(c.edge68, fitted),
    percent(c.edge95, fitted),
    c.widthLimit === null ? '' : percent(c.widthLimit, fitted),
    c.widthLimit === null ? '' : `${c.widthAtZeroRight} of ${c.widthAtZero}`,
    String(c.noMinimum),
    String(c.oneSided),
    String(c.open),
  ];
  return `| ${cells.join(' | ')} |`;
}

const options = process.argv.slice(2);
const scans = Number(options.find((option) => /^\d+$/.test(option)) ?? SCANS);
const results = SETTINGS.map((setting, index) => ({
  name: setting.name,
  ...coverageOf(setting, scans * (setting.repeat ?? 1), 1_000_000 * (index + 1)),
}));
if (options.includes('--json')) {
  console.log(JSON.stringify({ scans, settings: results }, null, 2));
} else {
  console.log(
    `| ${scans} scans of each | 68 % of the edge | 95 % of the edge | upper limit of the width | of those at width 0 | no minimum | one side open | both open |
|---|---|---|---|---|---|---|---|
${results.map(({ name, ...coverage }) => tableRow(name, coverage)).join('\n')}`,
  );
}
