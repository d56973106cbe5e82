/** A wrong call: shapes, empty or non-finite numbers, inconsistent input. Numerical outcomes are returned, not thrown. */
export class InversionError extends Error {
  override readonly name = 'InversionError';

  constructor(
    readonly code: string,
    message: string,
    readonly detail?: Record<string, unknown>,
  ) {
    super(message);
  }
}
