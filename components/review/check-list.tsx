import { Mark } from '@/components/ui/mark';
import type { Fit } from '@/lib/schemas/fit';

type Check = Fit['checks'][number];

const RANK: Record<Check['state'], number> = { problem: 0, caution: 1, fine: 2 };
const WORDS: Record<Check['state'], string> = {
  problem: 'Problem',
  caution: 'Caution',
  fine: 'Fine',
};

/** Checks in words, the serious ones first. */
export function CheckList({ checks }: { checks: readonly Check[] }) {
  if (checks.length === 0) return <p className="text-sm text-ink-3">No checks were kept.</p>;
  const sorted = checks.toSorted((a, b) => RANK[a.state] - RANK[b.state]);
  return (
    <ul className="grid gap-2">
      {sorted.map((check) => (
        <li key={check.id} id={`check-${check.id}`} className="flex gap-2 text-sm target:bg-sheet">
          <Mark kind={check.state} className="mt-0.5" />
          <span>
            <strong className="font-semibold">{WORDS[check.state]}.</strong> {check.message}
          </span>
        </li>
      ))}
    </ul>
  );
}

/** "2 cautions", "1 problem, 2 cautions" or "all fine". */
export function checkSummary(checks: readonly Check[]): string {
  const count = (state: Check['state']) => checks.filter((check) => check.state === state).length;
  const words = (number: number, one: string) =>
    number === 0 ? null : `${number} ${one}${number === 1 ? '' : 's'}`;
  const said = [words(count('problem'), 'problem'), words(count('caution'), 'caution')].filter(
    (part) => part !== null,
  );
  return said.length === 0 ? 'all fine' : said.join(', ');
}
