import type { Assumptions } from './assumptions';

/** Assumptions with what came before and what was undone. */
export interface AssumptionHistory {
  past: readonly Assumptions[];
  present: Assumptions;
  future: readonly Assumptions[];
  /** Changes of one kind in a row (typing a number, dragging an edge) are one step. */
  lastKind: string | null;
}

export type AssumptionChange =
  | { type: 'change'; kind?: string; change: (present: Assumptions) => Assumptions }
  | { type: 'pause' }
  | { type: 'undo' }
  | { type: 'redo' };

const MOST_STEPS = 200;

export function startHistory(present: Assumptions): AssumptionHistory {
  return { past: [], present, future: [], lastKind: null };
}

/** A change is a step that can be undone; a change after an undo forgets what was undone. */
export function assumptionHistory(
  history: AssumptionHistory,
  action: AssumptionChange,
): AssumptionHistory {
  if (action.type === 'undo') return undo(history);
  if (action.type === 'redo') return redo(history);
  if (action.type === 'pause') return { ...history, lastKind: null };
  const present = action.change(history.present);
  if (JSON.stringify(present) === JSON.stringify(history.present)) return history;
  const kind = action.kind ?? null;
  const joins = kind !== null && kind === history.lastKind;
  const past = joins ? history.past : [...history.past, history.present].slice(-MOST_STEPS);
  return { past, present, future: [], lastKind: kind };
}

function undo({ past, present, future, ...rest }: AssumptionHistory): AssumptionHistory {
  const before = past.at(-1);
  if (!before) return { past, present, future, ...rest };
  return { past: past.slice(0, -1), present: before, future: [present, ...future], lastKind: null };
}

function redo({ past, present, future, ...rest }: AssumptionHistory): AssumptionHistory {
  const [after, ...later] = future;
  if (!after) return { past, present, future, ...rest };
  return { past: [...past, present], present: after, future: later, lastKind: null };
}
