import type { FitAnswer, Observable, ParameterName } from '@/lib/inversion/index';

import { parameterNames, settingOf, type Assumptions, type Setting } from './assumptions';
import type { Drawn } from './drawn-values';
import { ParameterRow } from './parameter-row';

interface ParameterTableProps {
  assumptions: Pick<Assumptions, 'profile' | 'polarity' | 'capThicknessNm' | 'parameters'>;
  observable: Observable;
  answer: Pick<FitAnswer, 'parameters'> | null;
  drawn: Drawn;
  outOfDate: boolean;
  edit: null | {
    hold: (name: ParameterName, held: boolean) => void;
    change: (name: ParameterName, change: Partial<Setting>, kind: string) => void;
  };
}

export function ParameterTable({
  assumptions,
  observable,
  answer,
  drawn,
  outOfDate,
  edit,
}: ParameterTableProps) {
  const names = parameterNames(assumptions.profile, assumptions.capThicknessNm);
  return (
    <section aria-label="Parameters">
      <div className="flex justify-between border-b border-rule pb-1 text-[0.8125rem] text-ink-3">
        <span>parameter</span>
        <span className="flex gap-3">
          <span>value, 68 %</span>
          {edit ? <span>hold</span> : <span className="w-6" />}
        </span>
      </div>
      <ul>
        {names.map((name) => (
          <ParameterRow
            key={name}
            name={name}
            setting={settingOf(assumptions, name)}
            fitted={answer?.parameters.find((parameter) => parameter.name === name) ?? null}
            drawn={(drawn as Partial<Record<ParameterName, number>>)[name] ?? null}
            observable={observable}
            polarity={assumptions.polarity}
            outOfDate={outOfDate}
            edit={
              edit && {
                hold: (held) => edit.hold(name, held),
                change: (change, kind) => edit.change(name, change, kind),
              }
            }
          />
        ))}
      </ul>
    </section>
  );
}
