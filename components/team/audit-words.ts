/** "accept-fit" reads "accepted fit"; a verb without an entry reads as it is, without the hyphens. */
const PAST: Record<string, string> = {
  accept: 'accepted',
  archive: 'archived',
  cancel: 'withdrew',
  change: 'changed',
  comment: 'commented',
  create: 'added',
  discard: 'discarded',
  edit: 'edited',
  export: 'exported',
  invite: 'invited',
  issue: 'issued',
  remove: 'removed',
  restore: 'restored',
  return: 'returned',
  save: 'saved',
  sign: 'signed',
  submit: 'sent to review',
};

export function auditWords(verb: string): string {
  const [first = '', ...rest] = verb.split('-');
  return [PAST[first] ?? first, ...rest].join(' ');
}
