/** What each kind of act reads like; * stands for what it was done to. */
const PHRASES: Record<string, string> = {
  accept: 'accepted *',
  archive: 'archived *',
  cancel: 'withdrew *',
  change: 'changed *',
  comment: 'commented on *',
  create: 'added *',
  discard: 'discarded *',
  edit: 'edited *',
  export: 'exported *',
  invite: 'invited *',
  remove: 'removed *',
  restore: 'restored *',
  return: 'returned *',
  save: 'saved *',
  sign: 'signed *',
  submit: 'sent * to review',
};

/** "submit-fit" reads "sent fit to review"; an act without a phrase reads as it is, without hyphens. */
export function auditWords(verb: string): string {
  const [act = '', ...what] = verb.split('-');
  return (PHRASES[act] ?? `${act} *`).replace('*', what.join(' ')).trim();
}
