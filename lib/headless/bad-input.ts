/** Something that the caller must put right; each reason is one sentence that says where and what was expected. */
export class BadInput extends Error {
  override readonly name = 'BadInput';

  constructor(readonly reasons: readonly string[]) {
    super(reasons.join('\n'));
  }
}
