/** What a form's server action answers; null before the first try. */
export type FormState =
  | { ok: true; answer?: unknown }
  | { ok: false; message: string; fields: Record<string, string> }
  | null;

export type FormActionFunction = (
  previous: FormState,
  data: FormData | object,
) => Promise<FormState>;
