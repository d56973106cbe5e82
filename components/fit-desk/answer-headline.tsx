import { parameterParts } from '@/components/review/parameter-value';
import { asEntered } from '@/lib/format';
import type { FitParameter, Polarity } from '@/lib/inversion/index';

interface AnswerHeadlineProps {
  edge: FitParameter | null;
  width: FitParameter | null;
  polarity: Polarity;
  outOfDate: boolean;
}

/** The one answer of the page: where the carriers stop, with its interval, and how sharp that edge is. */
export function AnswerHeadline({ edge, width, polarity, outOfDate }: AnswerHeadlineProps) {
  const tone = outOfDate ? 'text-ink-3' : '';
  return (
    <div className={`mb-2 flex min-h-18 flex-wrap items-end gap-x-10 gap-y-2 ${tone}`}>
      <Answer
        parameter={edge}
        caption={polarity === 'depletion' ? 'depletion ends' : 'accumulation ends'}
        outOfDate={outOfDate}
        large
      />
      {width && (
        <Answer parameter={width} caption="edge width (σ)" outOfDate={outOfDate} large={false} />
      )}
    </div>
  );
}

function Answer({
  parameter,
  caption,
  large,
  outOfDate,
}: {
  parameter: FitParameter | null;
  caption: string;
  large: boolean;
  outOfDate: boolean;
}) {
  const size = large ? 'text-[2.5rem]' : 'text-[1.75rem]';
  const late = outOfDate ? ', out of date' : '';
  if (!parameter) {
    return (
      <p className="grid">
        <span className={`font-serif leading-none text-ink-3 ${size}`}>–</span>
        <span className="mt-1.5 text-sm text-ink-3">{caption}: not fitted yet</span>
      </p>
    );
  }
  if (parameter.held) {
    return (
      <p className="grid">
        <Whole value={asEntered(parameter.value)} size={size} full={String(parameter.value)} />
        <span className="mt-1.5 text-sm text-ink-2">{`${caption}, held${late}`}</span>
      </p>
    );
  }
  const parts = parameterParts(parameter, 'nm');
  if (parts.plus === null || parts.minus === null) {
    return (
      <p className="grid" title={parts.full}>
        <span className={`font-serif leading-none ${large ? 'text-[1.75rem]' : 'text-[1.375rem]'}`}>
          {parts.sentence}
        </span>
        <span className="mt-1.5 text-sm text-ink-2">{`${caption}, one-sided${late}`}</span>
      </p>
    );
  }
  return (
    <p className="grid" title={parts.full}>
      <span className="flex items-end gap-1.5">
        <span className={`font-serif leading-[0.95] tabular-nums ${size}`}>{parts.value}</span>
        <span className="grid figures text-[0.9375rem] leading-tight">
          <span>+{parts.plus}</span>
          <span>−{parts.minus}</span>
        </span>
        <span className={`font-serif leading-[1.1] text-ink-2 ${large ? 'text-2xl' : 'text-xl'}`}>
          nm
        </span>
      </span>
      <span className="mt-1.5 text-sm text-ink-2">{`${caption}, 68 % interval${late}`}</span>
    </p>
  );
}

function Whole({ value, size, full }: { value: string; size: string; full: string }) {
  return (
    <span title={full} className={`font-serif leading-[0.95] tabular-nums ${size}`}>
      {value} <span className="text-2xl text-ink-2">nm</span>
    </span>
  );
}
