/** Every refusal that a person may read has one of these codes; the table gives its HTTP status. */
export const STATUS_BY_CODE = {
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  conflict: 409,
  too_large: 413,
  invalid: 422,
  too_many: 429,
  unexpected: 500,
} as const;

export type ErrorCode = keyof typeof STATUS_BY_CODE;

/** A refusal with a sentence for the person; `fields` names the inputs that are meant. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly fields: Record<string, string>;

  constructor(
    code: ErrorCode,
    message: string,
    fields: Record<string, string> = {},
    options?: ErrorOptions,
  ) {
    super(message, options);
    this.name = 'AppError';
    this.code = code;
    this.fields = fields;
  }
}
