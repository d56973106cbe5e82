import type { FitRow, FitSpec } from '@/lib/schemas/fit';

import { BigNumber } from './big-number';
import { parameterParts } from './parameter-value';

/** What a fit or profile answers: where the edge is, and how wide. */
export function EdgeAnswer({
  edge,
  width,
  polarity,
}: Pick<FitRow, 'edge' | 'width'> & { polarity: FitSpec['polarity'] }) {
  if (edge === null) return <p className="text-ink-2">This profile has no edge.</p>;
  return (
    <div className="flex flex-wrap items-start gap-x-10 gap-y-3">
      <BigNumber parts={parameterParts(edge, 'nm')} caption={edgeCaption(edge, polarity)} />
      {width ? (
        <BigNumber
          second
          parts={parameterParts(width, 'nm')}
          caption={width.held ? 'edge width σ, held' : 'edge width σ'}
        />
      ) : (
        <p className="pt-2 text-sm text-ink-2">sharp edge, no width</p>
      )}
    </div>
  );
}

export function edgeCaption(
  edge: NonNullable<FitRow['edge']>,
  polarity: FitSpec['polarity'],
): string {
  const what = polarity === 'depletion' ? 'depletion ends' : 'accumulation ends';
  if (edge.held) return `${what}, held`;
  const twoSided = edge.interval68.every((end) => end !== null);
  return twoSided ? `${what}, 68 % interval` : what;
}
