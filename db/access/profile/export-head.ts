import type { HeadLine } from '@/lib/files/csv-text';
import type { Fit } from '@/lib/schemas/fit';
import type { IssuedProfileRow } from '@/lib/schemas/profile';

import { citationOf } from './citation';

/** What the file says before its first row: who, what, how, and what it may be used for. */
export function exportHead(row: IssuedProfileRow, fit: Fit, teamName: string): HeadLine[] {
  return [
    ['issued profile', row.number],
    ...(row.invented
      ? ([['invented data', 'yes, made by a generator for demonstration']] as const)
      : []),
    ['team', teamName],
    ['sample', `${row.sampleName}, ${row.material}`],
    ['energy scan', `${row.scanName}, ${fit.observable}`],
    ['stopping set', fit.stoppingSetName],
    ['fit', fit.name],
    ['fitted by', row.fittedBy],
    ['accepted by', row.issuedBy],
    ['issued at', row.issuedAt],
    ['citation', citationOf(row, teamName)],
    ...modelLines(fit),
    ...parameterLines(fit),
    ...fit.checks.map((check): HeadLine => [
      `check ${check.id}`,
      `${check.state}: ${check.message}`,
    ]),
    ['licence of use', `for the members of ${teamName}, with the citation`],
    ['sha256 of the points', fit.hashes.points],
    ['sha256 of the stopping set', fit.hashes.stoppingSet],
    ['sha256 of the inputs', fit.hashes.inputs],
  ];
}

function modelLines({ spec, answer }: Fit): HeadLine[] {
  const { response, carriers, capThicknessNm } = spec;
  const lines: HeadLine[] = [
    ['trial profile', `${spec.profile} edge, ${spec.polarity}`],
    ['response', response.kind],
    ['cap layer', `${capThicknessNm} nm; depths count from below it`],
  ];
  if (response.kind === 'capture-rate') {
    const { gammaCm3PerS, gammaSigmaCm3PerS, baselinePerUs } = response;
    const sigma = gammaSigmaCm3PerS === null ? '' : ` ± ${gammaSigmaCm3PerS}`;
    lines.push(
      [
        'capture coefficient',
        `${gammaCm3PerS}${sigma} cm3/s; its uncertainty scales the whole profile and is not in the bands`,
      ],
      ['rate without carriers', `${baselinePerUs} per us`],
    );
  }
  if (carriers.bulkPerCm3 !== null) {
    const sigma = carriers.bulkSigmaPerCm3 === null ? '' : ` ± ${carriers.bulkSigmaPerCm3}`;
    lines.push(['bulk concentration given', `${carriers.bulkPerCm3}${sigma} per cm3`]);
  }
  const { chiSquare, degreesOfFreedom, pValue, aicc } = answer;
  lines.push(
    ['chi square', `${chiSquare} for ${degreesOfFreedom} degrees of freedom`],
    ['p-value', pValue === null ? 'none' : String(pValue)],
    ['AICc', aicc === null ? 'none' : String(aicc)],
  );
  return lines;
}

function parameterLines({ answer, spec }: Fit): HeadLine[] {
  return answer.parameters.map((parameter): HeadLine => {
    const { name, value, held, atBound, interval68, interval95 } = parameter;
    const origin = spec.parameters[name]?.origin ?? '';
    if (held) return [`parameter ${name}`, `${value}, held${origin === '' ? '' : ` (${origin})`}`];
    const parts = [`${value}`, `68 %: ${ends(interval68)}`, `95 %: ${ends(interval95)}`];
    const prior = spec.parameters[name]?.prior ?? null;
    if (prior !== null)
      parts.push(`prior ${prior.mean} ± ${prior.sigma}${origin === '' ? '' : ` (${origin})`}`);
    if (atBound !== null) parts.push(`at its ${atBound} bound`);
    return [`parameter ${name}`, parts.join('; ')];
  });
}

function ends([lower, upper]: readonly [number | null, number | null]): string {
  return `${lower ?? 'open'} to ${upper ?? 'open'}`;
}
