/** A path on this server, or the home page: a link must not send a signed-in person elsewhere. */
export function safePath(wanted: unknown): string {
  if (typeof wanted !== 'string' || !/^\/(?![/\\])/.test(wanted)) return '/';
  return /[\\\u0000-\u001f]/.test(wanted) ? '/' : wanted;
}
