/** What a form shows after it was sent; null before. */
export type FormState<Answer = unknown> =
  | { ok: true; answer?: Answer }
  | { ok: false; message: string; fields: Record<string, string> }
  | null;
