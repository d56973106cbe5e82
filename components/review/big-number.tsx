import type { ResultParts } from '@/lib/format';
import { powerOfTen } from '@/lib/format';

/** The one answer of a page, in the serif, with its interval beside it. A one-sided result is a sentence. */
export function BigNumber({
  parts,
  caption,
  second = false,
}: {
  parts: ResultParts;
  caption: string;
  /** A result of second rank: smaller. */
  second?: boolean;
}) {
  const size = second ? 'text-2xl' : 'text-4xl';
  const twoSided = parts.plus !== null && parts.minus !== null;
  return (
    <div className="grid gap-0.5">
      <p className={`font-serif leading-tight ${size}`} title={parts.full}>
        {twoSided ? (
          <>
            <span className="sr-only">{parts.sentence}</span>
            <span aria-hidden="true" className="inline-flex items-center gap-1.5">
              {parts.value}
              <span className="grid figures text-sm leading-tight">
                <span>+{parts.plus}</span>
                <span>−{parts.minus}</span>
              </span>
              {parts.exponent !== null && <span>×{powerOfTen(parts.exponent)}</span>}
              <span className="text-[0.7em] text-ink-2">{parts.unit}</span>
            </span>
          </>
        ) : (
          parts.sentence
        )}
      </p>
      <p className="text-sm text-ink-2">{caption}</p>
    </div>
  );
}
