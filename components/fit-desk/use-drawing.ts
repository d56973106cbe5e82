'use client';

import { useCallback, useMemo, useState } from 'react';

import type { ScanCurve } from '@/components/charts/chart-types';
import type { ParameterValues, PreparedFit } from '@/lib/inversion/index';

import { held, settingOf, type Assumptions } from './assumptions';
import {
  answerValues,
  asDrawn,
  drawnChiSquare,
  valuesToDraw,
  type Drawable,
  type Drawn,
} from './drawn-values';
import type { GoodResult } from './fitting';
import { curveEnergies, foldedCurve, predictedAtPoints } from './prepared';

export interface Drawing {
  drawn: Drawn;
  /** Values that the handles stand at: drawn, held, fitted, or a plain guess. */
  values: ParameterValues;
  /** The folded curve of what was drawn; null while nothing is. */
  curve: ScanCurve | null;
  chiSquare: number | null;
  move: (name: Drawable, value: number) => void;
  /** The handle was let go: a held parameter takes the drawn value. */
  drop: (name: Drawable) => void;
  /** Holds what was drawn, so that the next fit keeps it. */
  hold: () => void;
  /** Back to the fit. */
  clear: () => void;
}

interface DrawingInput {
  prepared: PreparedFit | null;
  assumptions: Assumptions;
  good: GoodResult | null;
  change: (change: (present: Assumptions) => Assumptions) => void;
}

/** Drawing by hand: the curve is folded on this thread as a handle moves, and nothing is fitted. */
export function useDrawing({ prepared, assumptions, good, change }: DrawingInput): Drawing {
  const [drawn, setDrawn] = useState<Drawn>({});
  const values = useMemo(() => {
    if (!prepared) return {};
    const names = prepared.parameterNames;
    const heldValues = Object.fromEntries(
      names.flatMap((name) => {
        const setting = settingOf(assumptions, name);
        return setting.held && setting.value !== null ? [[name, setting.value]] : [];
      }),
    );
    return valuesToDraw({
      names,
      fitted: good ? answerValues(good.first.answer) : {},
      held: heldValues,
      points: prepared.input.points,
      deepestNm: prepared.deepestNm,
      drawn,
    });
  }, [prepared, assumptions, good, drawn]);

  const energies = useMemo(() => (prepared ? curveEnergies(prepared.input) : null), [prepared]);
  const isDrawn = Object.keys(drawn).length > 0;
  const curve = useMemo(
    () =>
      isDrawn && prepared && energies
        ? foldedCurve(prepared, values, energies, {
            label: 'drawn by hand',
            style: 'solid',
            colour: 'var(--ink)',
          })
        : null,
    [isDrawn, prepared, energies, values],
  );
  const chiSquare = useMemo(
    () =>
      isDrawn && prepared
        ? drawnChiSquare(prepared.input.points, predictedAtPoints(prepared, values))
        : null,
    [isDrawn, prepared, values],
  );

  const move = useCallback(
    (name: Drawable, value: number) => setDrawn((before) => ({ ...before, [name]: value })),
    [],
  );
  const clear = useCallback(() => setDrawn({}), []);
  const drop = (name: Drawable) => {
    const value = drawn[name];
    if (value === undefined || !settingOf(assumptions, name).held) return;
    change((present) => held(present, name, asDrawn(value)));
    setDrawn(({ [name]: _taken, ...others }) => others);
  };
  const hold = () => {
    change((present) =>
      Object.entries(drawn).reduce(
        (next, [name, value]) => held(next, name as Drawable, asDrawn(value)),
        present,
      ),
    );
    setDrawn({});
  };
  return { drawn, values, curve, chiSquare, move, drop, hold, clear };
}
