import type { FigureTable } from '@/components/charts/figure-table';

import type { MarkedProfile } from './compare-profile-chart';
import type { MarkedResiduals } from './residual-rows';

/** Numbers behind the profiles: every depth of every fit in a row of its own, as their grids differ. */
export function profileTable(profiles: readonly MarkedProfile[]): FigureTable {
  const unit = profiles[0]?.profile.unit ?? 'cm⁻³';
  return {
    columns: [
      'fit',
      'depth (nm)',
      unit,
      'lower 68 %',
      'upper 68 %',
      'lower 95 %',
      'upper 95 %',
      'flag',
    ],
    rows: profiles.flatMap(({ mark, profile }) =>
      profile.points.map((point) => [
        mark.letter,
        point.depthNm,
        point.value,
        point.lower68,
        point.upper68,
        point.lower95,
        point.upper95,
        point.flag,
      ]),
    ),
  };
}

/** Points of the scan with the prediction of every fit; blank where a fit does not hold the point. */
export function scanTable(fits: readonly MarkedResiduals[]): FigureTable {
  const [first] = fits;
  return {
    columns: ['energy (keV)', 'observed', 'σ', ...fits.map(({ mark }) => `${mark.letter} folded`)],
    rows: (first?.residuals ?? []).map(({ energyKeV, observed, sigma }) => [
      energyKeV,
      observed,
      sigma,
      ...fits.map((fit) => at(fit, energyKeV)?.predicted ?? null),
    ]),
  };
}

export function residualTable(fits: readonly MarkedResiduals[]): FigureTable {
  const [first] = fits;
  return {
    columns: ['energy (keV)', ...fits.map(({ mark }) => `${mark.letter} residual / σ`)],
    rows: (first?.residuals ?? []).map(({ energyKeV }) => [
      energyKeV,
      ...fits.map((fit) => at(fit, energyKeV)?.reduced ?? null),
    ]),
  };
}

const at = ({ residuals }: MarkedResiduals, energyKeV: number) =>
  residuals.find((residual) => residual.energyKeV === energyKeV);
