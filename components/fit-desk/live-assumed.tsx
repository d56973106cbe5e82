import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import { AlsoAssumed } from './also-assumed';
import { freed, held, withSetting } from './assumptions';
import { asDrawn } from './drawn-values';
import { ChecksList } from './checks-list';
import { FitBar } from './fit-bar';
import { ParameterTable } from './parameter-table';
import { ProfileChoice } from './profile-choice';
import type { DeskFigures } from './use-desk-figures';
import type { FitDesk } from './use-fit-desk';

/** One empty list, so that nothing is drawn anew for another one. */
const NOTHING: readonly never[] = [];

interface LiveAssumedProps {
  desk: FitDesk;
  figures: DeskFigures;
  scan: Scan;
  sample: Sample;
  stoppingSets: readonly StoppingSetRow[];
}

/** The left column at work. It is one form, so that Enter in any field fits. */
export function LiveAssumed({ desk, figures, scan, sample, stoppingSets }: LiveAssumedProps) {
  const { assumptions, change, fit, drawing, outOfDate, comparison } = desk;
  return (
    <form
      className="grid gap-5"
      aria-label="Assumptions"
      onSubmit={(event) => {
        event.preventDefault();
        desk.startFit();
      }}
    >
      <ProfileChoice
        value={assumptions.profile}
        onChange={(profile) => change((present) => ({ ...present, profile }))}
      />
      <ParameterTable
        assumptions={assumptions}
        observable={scan.observable}
        answer={figures.answer}
        drawn={drawing.drawn}
        outOfDate={outOfDate}
        edit={{
          hold: (name, isHeld) =>
            change((present) =>
              isHeld
                ? held(present, name, asDrawn(drawing.values[name] ?? 0))
                : freed(present, name),
            ),
          change: (name, setting, kind) =>
            change((present) => withSetting(present, name, setting), kind),
        }}
      />
      <FitBar
        fit={fit}
        outOfDate={outOfDate}
        obstacle={desk.obstacle}
        ready={desk.prepared !== null}
        loading={desk.stopping.loading}
        comparing={comparison.busy}
        onCompare={desk.compareAll}
      />
      <AlsoAssumed
        assumptions={assumptions}
        scan={scan}
        sample={sample}
        points={desk.points}
        sets={stoppingSets}
        interpolatedKeV={figures.interpolatedKeV}
        warnings={desk.stopping.answer?.warnings ?? NOTHING}
        change={change}
      />
      <ChecksList checks={fit.good?.checks ?? NOTHING} outOfDate={outOfDate} />
    </form>
  );
}
