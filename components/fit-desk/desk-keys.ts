export type DeskKey = 'fit' | 'undo' | 'redo';

const TYPING = 'input, textarea, select, [contenteditable="true"]';
const PRESSING = 'button, a, summary, [role="dialog"], [role="alertdialog"]';

/** What a key means to the desk as a whole; null where it belongs to what has the focus. */
export function deskKey(
  event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'shiftKey' | 'altKey' | 'target'>,
): DeskKey | null {
  const target = event.target instanceof Element ? event.target : null;
  const typing = target?.closest(TYPING) ?? null;
  const command = (event.ctrlKey || event.metaKey) && !event.altKey;
  if (command && !isText(typing)) {
    const key = event.key.toLowerCase();
    if (key === 'z') return event.shiftKey ? 'redo' : 'undo';
    if (key === 'y') return 'redo';
  }
  if (event.key === 'Enter' && !command && !typing && !target?.closest(PRESSING)) return 'fit';
  return null;
}

/** Fields of text have an undo of their own. */
function isText(element: Element | null): boolean {
  if (!element) return false;
  return (
    !(element instanceof HTMLInputElement && ['checkbox', 'radio'].includes(element.type)) &&
    !(element instanceof HTMLSelectElement)
  );
}
