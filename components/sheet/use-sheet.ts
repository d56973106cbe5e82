'use client';

import { useMemo, useReducer } from 'react';

import {
  withBlock,
  withCell,
  withoutRow,
  withRowAt,
  withRowToggled,
  type SheetContent,
} from './sheet-rows';

/** Steps that can be undone; more are forgotten from the far end. */
const MAX_STEPS = 200;

interface SheetHistory {
  past: readonly SheetContent[];
  content: SheetContent;
  future: readonly SheetContent[];
  /** Typing on in one cell is one step: the cell of the last step, or null. */
  typingIn: string | null;
}

type SheetAction =
  | { kind: 'change'; change: (content: SheetContent) => SheetContent; typingIn: string | null }
  | { kind: 'settle' | 'undo' | 'redo' };

function reduce(history: SheetHistory, action: SheetAction): SheetHistory {
  const { past, content, future, typingIn } = history;
  switch (action.kind) {
    case 'settle':
      return typingIn === null ? history : { ...history, typingIn: null };
    case 'undo': {
      const previous = past.at(-1);
      if (!previous) return history;
      return {
        past: past.slice(0, -1),
        content: previous,
        future: [content, ...future],
        typingIn: null,
      };
    }
    case 'redo': {
      const [next, ...rest] = future;
      if (!next) return history;
      return { past: [...past, content], content: next, future: rest, typingIn: null };
    }
    case 'change': {
      const changed = action.change(content);
      const sameStep = action.typingIn !== null && action.typingIn === typingIn;
      return {
        past: sameStep ? past : [...past, content].slice(-MAX_STEPS),
        content: changed,
        future: [],
        typingIn: action.typingIn,
      };
    }
  }
}

export interface SheetModel {
  content: SheetContent;
  columnCount: number;
  canUndo: boolean;
  canRedo: boolean;
  type: (rowId: number, column: number, text: string) => void;
  paste: (rowIndex: number, column: number, block: readonly (readonly string[])[]) => void;
  addRow: (index: number) => void;
  removeRow: (rowId: number) => void;
  toggleRow: (rowId: number) => void;
  /** Ends a run of typing, so that the next one is its own step. */
  settle: () => void;
  undo: () => void;
  redo: () => void;
}

/** The content of a grid with its history: every change is one step back, typing in a cell is one step. */
export function useSheet(initial: () => SheetContent, columnCount: number): SheetModel {
  const [history, dispatch] = useReducer(reduce, null, () => ({
    past: [],
    content: initial(),
    future: [],
    typingIn: null,
  }));
  const verbs = useMemo(() => {
    const change = (
      make: (content: SheetContent) => SheetContent,
      typingIn: string | null = null,
    ) => dispatch({ kind: 'change', change: make, typingIn });
    return {
      type: (rowId: number, column: number, text: string) =>
        change((content) => withCell(content, rowId, column, text), `${rowId}:${column}`),
      paste: (rowIndex: number, column: number, block: readonly (readonly string[])[]) =>
        change((content) => withBlock(content, rowIndex, column, block, columnCount)),
      addRow: (index: number) => change((content) => withRowAt(content, index, columnCount)),
      removeRow: (rowId: number) => change((content) => withoutRow(content, rowId)),
      toggleRow: (rowId: number) => change((content) => withRowToggled(content, rowId)),
      settle: () => dispatch({ kind: 'settle' }),
      undo: () => dispatch({ kind: 'undo' }),
      redo: () => dispatch({ kind: 'redo' }),
    };
  }, [columnCount]);
  return {
    ...verbs,
    content: history.content,
    columnCount,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
  };
}
