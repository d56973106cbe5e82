import { formatProbability, formatWithInterval, significant } from '@/lib/format';
import type { ParameterName } from '@/lib/inversion/index';
import type { InvertReport } from './report';

const LABELS: Record<ParameterName, readonly [label: string, unit: string]> = {
  edgeDepthNm: ['edge depth', 'nm'],
  edgeWidthNm: ['edge width (σ)', 'nm'],
  layerThicknessNm: ['layer thickness', 'nm'],
  farEdgeWidthNm: ['far edge width (σ)', 'nm'],
  surfacePotentialEv: ['band bending at the surface', 'eV'],
  bulkPerCm3: ['bulk concentration', 'cm⁻³'],
  levelTop: ['level at the surface', ''],
  levelBulk: ['level in the bulk', ''],
  levelCap: ['level in the cap', ''],
  depthScale: ['depth scale', ''],
};
const BOUND_WORDS: Partial<Record<ParameterName, { more: string; less: string }>> = {
  edgeDepthNm: { more: 'deeper than', less: 'shallower than' },
  edgeWidthNm: { more: 'wider than', less: 'narrower than' },
};

/** The report for a reader: parameters with 68 % intervals, how good the fit is, and what to beware of. */
export function tableText(report: InvertReport, levelUnit: string): string {
  const parameters = report.parameters.map((parameter) => [
    LABELS[parameter.name][0],
    parameter.held
      ? `${significant(parameter.value, 4)} (held)`
      : parameterText(parameter, levelUnit),
    parameter.atBound ? 'at its bound' : '',
  ]);
  const quality = [
    [
      'χ²',
      `${significant(report.chiSquare, 4)} for ${report.degreesOfFreedom} degrees of freedom`,
      '',
    ],
    ['p-value', report.pValue === null ? 'none' : formatProbability(report.pValue), ''],
    ['AICc', report.aicc === null ? 'none' : significant(report.aicc, 4), ''],
  ];
  const checks = report.checks.map(({ state, message }) => `${state}: ${message}`);
  return [
    `${report.profile.kind} edge, ${report.status}`,
    '',
    ...columns([...parameters, ...quality]),
    '',
    ...checks,
    '',
  ].join('\n');
}

function parameterText(parameter: InvertReport['parameters'][number], levelUnit: string): string {
  const { name, value, interval68, interval95, sigma } = parameter;
  const unit = name.startsWith('level') ? levelUnit : LABELS[name][1];
  return formatWithInterval(value, interval68, sigma, unit, {
    interval95,
    words: BOUND_WORDS[name],
  }).sentence;
}

function columns(rows: readonly (readonly string[])[]): string[] {
  const widths = [0, 1].map((index) => Math.max(...rows.map((row) => (row[index] ?? '').length)));
  return rows.map((row) =>
    row
      .map((cell, index) => cell.padEnd(widths[index] ?? 0))
      .join('  ')
      .trimEnd(),
  );
}
