import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Progress } from '@/components/ui/progress';

import type { Fitting } from './fitting';

interface FitBarProps {
  fit: Pick<Fitting, 'run' | 'progress' | 'good' | 'refusal' | 'stopped'> & { stop: () => void };
  outOfDate: boolean;
  /** Why a fit cannot start. */
  obstacle: string | null;
  /** Everything that a fit needs is there. */
  ready: boolean;
  /** The inputs are still on their way. */
  loading: boolean;
  comparing: boolean;
  onCompare: () => void;
}

/** Fit and Compare all, with what is under way below them. The button that fits is the form's own, so Enter fits, too. */
export function FitBar({
  fit,
  outOfDate,
  obstacle,
  ready,
  loading,
  comparing,
  onCompare,
}: FitBarProps) {
  const blocked = !ready;
  const problem = obstacle ?? fit.refusal?.message ?? null;
  return (
    <section aria-label="Fit" className="grid gap-2">
      <div className="flex gap-2">
        <Button type="submit" variant="primary" disabled={blocked} className="flex-1">
          Fit
        </Button>
        <Button onClick={onCompare} disabled={blocked} pending={comparing}>
          Compare all
        </Button>
      </div>
      <div className="h-[3px]">
        {fit.run !== null && (
          <Progress
            label="Resampling"
            value={fit.progress?.done ?? null}
            max={fit.progress?.total ?? 1}
          />
        )}
      </div>
      <div className="flex min-h-6 items-baseline justify-between gap-3 text-[0.8125rem] text-ink-2">
        <span role="status">{statusText(fit, outOfDate, loading)}</span>
        {fit.run !== null && (
          <button
            type="button"
            onClick={fit.stop}
            className="min-h-6 px-1 underline decoration-edge underline-offset-4 hover:decoration-coral"
          >
            Stop
          </button>
        )}
      </div>
      {problem !== null && (
        <Notice kind="problem" title="No fit">
          {problem}
          {fit.good && obstacle === null ? ' The last good result stays below.' : ''}
        </Notice>
      )}
    </section>
  );
}

function statusText(
  { run, progress, good, stopped }: FitBarProps['fit'],
  outOfDate: boolean,
  loading: boolean,
): string {
  if (loading) return 'Stopping profiles are on their way.';
  if (run !== null && progress) {
    return `Resampling ${grouped(progress.done)} of ${grouped(progress.total)}, ${seconds(progress.elapsedMs)}`;
  }
  if (run !== null) return 'Fitting';
  if (!good) return '';
  if (outOfDate) return 'Something changed since: the result is out of date.';
  if (stopped) return 'Stopped: the bands are the quick ones.';
  return good.profile.bands === 'bootstrap'
    ? `Fitted and resampled in ${seconds(good.elapsedMs)}`
    : `Fitted in ${seconds(good.elapsedMs)}`;
}

const grouped = (count: number) => count.toLocaleString('en-GB');
const seconds = (ms: number) =>
  ms < 100 ? `${Math.max(1, Math.round(ms))} ms` : `${(ms / 1000).toFixed(1)} s`;
