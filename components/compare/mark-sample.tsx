import type { FitMark } from './fit-mark';

/** The letter and the line of one fit, as they stand in the figures. */
export function MarkSample({ mark }: { mark: FitMark }) {
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <svg width="34" height="18" viewBox="0 0 34 18" aria-hidden="true" className="shrink-0">
        <line
          x1="0"
          x2="34"
          y1="9"
          y2="9"
          stroke={mark.colour}
          strokeWidth={mark.style === 'solid' ? 2.25 : 1.6}
          strokeDasharray={mark.style === 'dashed' ? '5 4' : undefined}
        />
        <circle cx="17" cy="9" r="8" fill="var(--paper)" stroke={mark.colour} strokeWidth="1.5" />
        <text
          x="17"
          y="12.75"
          textAnchor="middle"
          fill="var(--ink)"
          fontSize="10.5"
          fontWeight="600"
        >
          {mark.letter}
        </text>
      </svg>
      <span className="sr-only">Fit {mark.letter}:</span>
    </span>
  );
}
