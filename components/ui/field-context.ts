'use client';

import { createContext, useContext } from 'react';

type FieldContextValue = {
  id: string;
  name?: string;
  describedBy?: string;
  invalid: boolean;
  required: boolean;
};

export const FieldContext = createContext<FieldContextValue | null>(null);

/** What a control inside a Field takes over from it; its own properties win. */
export function useFieldControl() {
  const field = useContext(FieldContext);
  if (field === null) return {};
  return {
    id: field.id,
    name: field.name,
    'aria-describedby': field.describedBy,
    'aria-invalid': field.invalid || undefined,
    'aria-required': field.required || undefined,
  };
}
