'use client';

import { useId, useState } from 'react';

import { parameterParts } from '@/components/review/parameter-value';
import { parameterLabel, parameterUnit } from '@/components/review/parameter-words';
import { Switch } from '@/components/ui/switch';
import { asEntered } from '@/lib/format';
import type { FitParameter, Observable, ParameterName, Polarity } from '@/lib/inversion/index';

import type { Setting } from './assumptions';
import { PriorEditor } from './prior-editor';

export interface ParameterRowProps {
  name: ParameterName;
  setting: Setting;
  /** The parameter of the last good result; null before the first. */
  fitted: FitParameter | null;
  /** A value drawn by hand. */
  drawn: number | null;
  observable: Observable;
  polarity: Polarity;
  /** The result belongs to other assumptions than those shown. */
  outOfDate: boolean;
  /** null on a saved fit. */
  edit: null | {
    hold: (held: boolean) => void;
    change: (change: Partial<Setting>, kind: string) => void;
  };
}

/** One parameter: value with interval, held or free, and where a number comes from. */
export function ParameterRow({
  name,
  setting,
  fitted,
  drawn,
  observable,
  polarity,
  outOfDate,
  edit,
}: ParameterRowProps) {
  const [open, setOpen] = useState(false);
  const panelId = useId();
  const label = parameterLabel(name, { observable, spec: { polarity } });
  // The column is narrow: the side in brackets is said on hover and to a screen reader.
  const short = label.replace(/ \(.* side\)$/, '');
  const unit = parameterUnit(name, observable);
  const from =
    setting.prior && !setting.held
      ? `prior ${asEntered(setting.prior.mean)} ± ${asEntered(setting.prior.sigma)}`
      : '';
  const note = [from, setting.origin].filter(Boolean).join(' from ');
  return (
    <li className="border-t border-rule py-1.5 first:border-t-0">
      <div className="grid grid-cols-[minmax(0,1fr)_auto_2rem] items-baseline gap-x-2">
        <span className="min-w-0 text-sm">
          {edit ? (
            <button
              type="button"
              title={label}
              aria-expanded={open}
              aria-controls={panelId}
              onClick={() => setOpen(!open)}
              className="text-left underline decoration-edge decoration-dotted underline-offset-4 hover:decoration-coral"
            >
              {short}
              <span className="sr-only">{label.slice(short.length)}</span>
            </button>
          ) : (
            short
          )}
        </span>
        <ValueText {...{ setting, fitted, drawn, unit, outOfDate }} />
        {edit ? (
          <Switch
            label={`Hold ${label}`}
            labelHidden
            checked={setting.held}
            onChange={(event) => edit.hold(event.target.checked)}
            className="justify-self-end"
          />
        ) : (
          <span />
        )}
      </div>
      {note && <p className="text-[0.8125rem] text-ink-3">{note}</p>}
      {edit && (
        <div id={panelId} hidden={!open}>
          {open && (
            <PriorEditor
              label={label}
              unit={unit}
              setting={setting}
              onChange={(change, field) => edit.change(change, `${name} ${field}`)}
            />
          )}
        </div>
      )}
    </li>
  );
}

function ValueText({
  setting,
  fitted,
  drawn,
  unit,
  outOfDate,
}: Pick<ParameterRowProps, 'setting' | 'fitted' | 'drawn' | 'outOfDate'> & { unit: string }) {
  if (drawn !== null)
    return (
      <Figures
        value={asEntered(Number(drawn.toPrecision(4)))}
        unit={unit}
        side="drawn"
        full={String(drawn)}
      />
    );
  if (setting.held)
    return (
      <Figures
        value={setting.value === null ? '–' : asEntered(setting.value)}
        unit={unit}
        side="held"
        full={String(setting.value)}
      />
    );
  if (!fitted || fitted.held)
    return <Figures value="–" unit="" side="free" full="not fitted yet" />;
  const parts = parameterParts(fitted, unit);
  if (parts.plus === null || parts.minus === null) {
    return (
      <span
        title={parts.full}
        className={`max-w-36 text-right figures text-[0.8125rem] ${outOfDate ? 'text-ink-3' : ''}`}
      >
        {parts.sentence}
      </span>
    );
  }
  const side = parts.plus === parts.minus ? `±${parts.plus}` : `+${parts.plus} −${parts.minus}`;
  return (
    <Figures
      value={parts.value}
      unit={parts.exponent === null ? unit : `×10^${parts.exponent} ${unit}`}
      side={side}
      full={parts.full}
      faint={outOfDate}
    />
  );
}

function Figures({
  value,
  unit,
  side,
  full,
  faint = false,
}: {
  value: string;
  unit: string;
  side: string;
  full: string;
  faint?: boolean;
}) {
  return (
    <span
      title={full}
      className={`flex items-baseline justify-end gap-x-2 text-right figures text-sm ${faint ? 'text-ink-3' : ''}`}
    >
      <span className="whitespace-nowrap">
        {value}
        {unit && <span className="text-ink-3"> {unit}</span>}
      </span>
      <span className="min-w-[4.6rem] text-[0.8125rem] whitespace-nowrap text-ink-2">{side}</span>
    </span>
  );
}
