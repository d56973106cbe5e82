'use client';

import { parseAsString, useQueryStates } from 'nuqs';
import { useCallback, useEffect, useReducer, useState } from 'react';

import { assumptionHistory, startHistory } from './assumption-history';
import type { Assumptions } from './assumptions';
import { ADDRESS_WORDS, fromAddress, toAddress } from './assumptions-address';

const QUERY = Object.fromEntries(ADDRESS_WORDS.map((word) => [word, parseAsString]));

export interface AssumptionsInHand {
  assumptions: Assumptions;
  /** Changes in a row of one kind are one step of undo. */
  change: (change: (present: Assumptions) => Assumptions, kind?: string) => void;
  undo: () => void;
  redo: () => void;
  canUndo: boolean;
  canRedo: boolean;
  /** Words of the address that could not be read and were left at their usual value. */
  unread: readonly string[];
}

/** Assumptions with their history, mirrored in the address so that a link opens what the sender saw. */
export function useAssumptions(usual: Assumptions): AssumptionsInHand {
  const [query, setQuery] = useQueryStates(QUERY, { history: 'replace', shallow: true });
  const [defaults] = useState(usual);
  const [start] = useState(() => fromAddress(query, defaults));
  const [history, dispatch] = useReducer(assumptionHistory, start.assumptions, startHistory);
  const { present } = history;

  useEffect(() => {
    void setQuery(toAddress(present, defaults));
  }, [present, defaults, setQuery]);

  const change = useCallback<AssumptionsInHand['change']>(
    (work, kind) => dispatch({ type: 'change', change: work, kind }),
    [],
  );
  const undo = useCallback(() => dispatch({ type: 'undo' }), []);
  const redo = useCallback(() => dispatch({ type: 'redo' }), []);
  return {
    assumptions: present,
    change,
    undo,
    redo,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    unread: start.unread,
  };
}
