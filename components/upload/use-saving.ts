'use client';

import { useState } from 'react';
import type { z } from 'zod';

import { fieldFaults, withoutPrefix } from './field-faults';
import type { Sent } from './send-details';

/** One form on its way to the server: what is wrong, whether it travels, and why it was refused. */
export function useSaving(metaSchema: z.ZodType) {
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [refusal, setRefusal] = useState<string | null>(null);
  const [saving, setSaving] = useState(false);

  /** Sends when the fields are right; everything stays as it is when the server refuses. */
  const save = async (meta: unknown, send: () => Promise<Sent>, onStored: (id: string) => void) => {
    const own = fieldFaults(metaSchema, meta);
    setFaults(own);
    const [firstFault] = Object.values(own);
    setRefusal(firstFault ?? null);
    if (firstFault !== undefined) return;
    setSaving(true);
    const sent = await send();
    if (sent.ok) return onStored(sent.id);
    setSaving(false);
    setFaults(withoutPrefix(sent.fields, 'meta.'));
    setRefusal(sent.message);
  };
  return { faults, refusal, saving, save };
}
