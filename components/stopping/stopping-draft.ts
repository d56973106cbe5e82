import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

/** Name and origin of a stopping set as they stand in the form. */
export interface StoppingDraft {
  name: string;
  layerStack: string;
  origin: string;
  notes: string;
}

export const NEW_STOPPING: StoppingDraft = { name: '', layerStack: '', origin: '', notes: '' };

export function draftOfStopping({
  name,
  layerStack,
  origin,
  notes,
}: StoppingSetRow): StoppingDraft {
  return { name, layerStack, origin, notes };
}
