import { compareAddress } from '@/components/compare/compare-address';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import { withDecimals } from '@/lib/format';
import type { FitRow } from '@/lib/schemas/fit';

import { parameterText } from './parameter-value';

const OTHER_KIND: Record<FitRow['profile'], FitRow['profile']> = {
  sharp: 'graded',
  graded: 'sharp',
};

/** Other fits of the same scan, each one click away from being put over this one. */
export function SiblingFits({ fit, others }: { fit: FitRow; others: readonly FitRow[] }) {
  if (others.length === 0) {
    return (
      <p className="text-sm text-ink-2">
        This scan has no other fit. Before accepting, ask for a {OTHER_KIND[fit.profile]} edge on
        the same data.
      </p>
    );
  }
  const otherKind = others.some((other) => other.profile !== fit.profile);
  return (
    <div className="grid gap-3">
      {!otherKind && (
        <p className="text-sm text-ink-2">
          None of them has a {OTHER_KIND[fit.profile]} edge to compare with.
        </p>
      )}
      <ul className="grid border-t border-rule">
        {others.map((other) => (
          <li
            key={other.id}
            className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule py-2"
          >
            <TextLink href={`/fits/${other.id}`} className="font-medium">
              {other.name}
            </TextLink>
            <StateBadge state={other.state} />
            <span className="text-[0.8125rem] text-ink-2">
              {other.profile} edge
              {other.edge && `, ${parameterText(other.edge, 'nm')}`}, χ²{' '}
              {withDecimals(other.chiSquare, 1)} for {other.degreesOfFreedom}
            </span>
            <TextLink
              href={compareAddress([fit.id, other.id])}
              className="ml-auto text-[0.8125rem]"
              aria-label={`Compare with ${other.name}`}
            >
              compare
            </TextLink>
          </li>
        ))}
      </ul>
    </div>
  );
}
