/** What a form's server action answers; null before the first try. */
export type FormState<Answer = unknown> =
  | { ok: true; answer?: Answer }
  | { ok: false; message: string; fields: Record<string, string> }
  | null;

export type FormActionFunction<Answer = unknown> = (
  previous: FormState<Answer>,
  data: FormData | object,
) => Promise<FormState<Answer>>;
