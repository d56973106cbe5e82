'use client';

import { useCallback, useState } from 'react';

import type { FitInput, ProfileKind } from '@/lib/inversion/index';
import type { InversionPool } from '@/workers/pool';

import type { ComparisonResult } from './comparison';

export interface ComparisonInHand {
  result: ComparisonResult | null;
  busy: boolean;
  error: string | null;
  start: (key: string, inputs: readonly { kind: ProfileKind; input: FitInput }[]) => Promise<void>;
}

/** Fits every trial profile to the same data. */
export function useComparison(poolOf: () => InversionPool): ComparisonInHand {
  const [result, setResult] = useState<ComparisonResult | null>(null);
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<string | null>(null);

  const start = useCallback<ComparisonInHand['start']>(
    async (key, inputs) => {
      setBusy(true);
      setError(null);
      try {
        const replies = await poolOf().fitEach(inputs.map(({ input }) => input));
        const answered = inputs.map((asked, index) => ({ ...asked, reply: replies[index]! }));
        setResult({
          key,
          fits: answered.flatMap(({ kind, input, reply }) =>
            reply.ok
              ? [{ kind, input, answer: reply.value.answer, profile: reply.value.profile }]
              : [],
          ),
          refusals: answered.flatMap(({ kind, reply }) =>
            reply.ok ? [] : [{ kind, message: reply.message }],
          ),
        });
      } catch (reason) {
        setError(reason instanceof Error ? reason.message : 'The comparison broke off.');
      } finally {
        setBusy(false);
      }
    },
    [poolOf],
  );
  return { result, busy, error, start };
}
