import Link from 'next/link';

import { significant } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';
import type { Sample } from '@/lib/schemas/sample';

import { carriersText } from './carrier-settings';
import { responseText } from './response-settings';

/** What a saved fit assumed besides its parameters, and the hashes of what it was made from. */
export function FrozenSettings({ fit, carrier }: { fit: Fit; carrier: Sample['carrier'] }) {
  const { spec } = fit;
  const rows: [string, React.ReactNode][] = [
    [
      'Stopping set',
      <Link key="set" href={`/stopping/${fit.stoppingSetId}`} className="text-link">
        {fit.stoppingSetName}
      </Link>,
    ],
    ['Response', responseText(spec.response)],
    ...(spec.response.kind === 'capture-rate'
      ? [['Λ₀', `${significant(spec.response.baselinePerUs)} µs⁻¹`] as [string, string]]
      : []),
    ['Polarity', spec.polarity],
    ...(spec.response.kind === 'two-level'
      ? [[`Bulk ${carrier}`, carriersText(spec.carriers)] as [string, string]]
      : []),
    ['Cap layer', spec.capThicknessNm === 0 ? 'none' : `${spec.capThicknessNm} nm`],
    [
      'Switched off',
      spec.switchedOffKeV.length === 0 ? 'no point' : `${spec.switchedOffKeV.join(', ')} keV`,
    ],
    [
      'Bands',
      spec.resamples === 0
        ? 'of the covariance'
        : `${spec.resamples.toLocaleString('en-GB')} resamples, seed ${spec.seed}`,
    ],
  ];
  return (
    <section aria-labelledby="also-heading">
      <h2 id="also-heading" className="mb-1 text-sm text-ink-2">
        Also assumed
      </h2>
      <dl className="text-sm">
        {rows.map(([term, detail]) => (
          <div
            key={term}
            className="flex justify-between gap-3 border-t border-rule py-1.5 first:border-t-0"
          >
            <dt>{term}</dt>
            <dd className="min-w-0 text-right text-[0.8125rem] text-ink-2">{detail}</dd>
          </div>
        ))}
      </dl>
      <details className="mt-1 border-t border-rule py-1.5 text-sm">
        <summary>SHA-256 of the inputs</summary>
        <dl className="mt-1 grid gap-1 text-[0.8125rem] text-ink-2">
          {Object.entries({
            Points: fit.hashes.points,
            'Stopping set': fit.hashes.stoppingSet,
            'All inputs': fit.hashes.inputs,
          }).map(([term, hash]) => (
            <div key={term}>
              <dt className="text-ink-3">{term}</dt>
              <dd className="font-mono break-all">{hash}</dd>
            </div>
          ))}
        </dl>
      </details>
    </section>
  );
}
