'use client';

import { Button } from '@/components/ui/button';
import type { FileProblem } from '@/lib/files/problem';

/** More than this many are counted, not listed. */
const MOST_LISTED = 50;
const MOST_NAMED_AT_ONCE = 12;

interface ProblemListProps {
  problems: readonly FileProblem[];
  /** Whether leaving out its line would mend it. */
  mayLeaveOut: (problem: FileProblem) => boolean;
  onLeaveOut: (problems: readonly FileProblem[]) => void;
}

/** Every fault by file, line and column; a bad line can be left out, by its number. */
export function ProblemList({ problems, mayLeaveOut, onLeaveOut }: ProblemListProps) {
  if (problems.length === 0) return null;
  const removable = problems.filter(mayLeaveOut);
  const lines = [...new Set(removable.map(({ line }) => line))];
  const offered = new Set<string>();
  return (
    <section aria-label="Lines to mend" className="border-l-2 border-coral-ink pl-3">
      <ul className="space-y-2 text-sm">
        {problems.slice(0, MOST_LISTED).map((problem, index) => {
          const place = `${problem.fileName}:${problem.line}`;
          const offer = mayLeaveOut(problem) && !offered.has(place);
          offered.add(place);
          return (
            <li key={index} className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
              <span className="min-w-0 break-words">{problem.message}</span>
              {offer && (
                <Button size="small" onClick={() => onLeaveOut([problem])}>
                  Leave out line {problem.line}
                </Button>
              )}
            </li>
          );
        })}
      </ul>
      {problems.length > MOST_LISTED && (
        <p className="mt-2 text-sm text-ink-2">
          … and {(problems.length - MOST_LISTED).toLocaleString('en')} more like these.
        </p>
      )}
      {lines.length > 1 && (
        <Button className="mt-2" size="small" onClick={() => onLeaveOut(removable)}>
          {lines.length <= MOST_NAMED_AT_ONCE
            ? `Leave out lines ${lines.join(', ')}`
            : `Leave out all ${lines.length} bad lines`}
        </Button>
      )}
    </section>
  );
}
