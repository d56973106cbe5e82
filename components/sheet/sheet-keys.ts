import type { KeyboardEvent } from 'react';

export interface CellPlace {
  row: number;
  column: number;
}

/** What a key asks of the grid; null leaves the key to the cell itself. */
type KeyWish = { kind: 'move'; to: CellPlace } | { kind: 'undo' | 'redo' } | null;

/**
 * Up, Down and Enter change the row; Left and Right leave the cell only from its ends, so that the
 * text inside can still be edited; Ctrl or ⌘ with Z and Y undo and redo. Tab stays the browser's.
 */
export function keyWish(event: KeyboardEvent<HTMLInputElement>, at: CellPlace): KeyWish {
  if (event.nativeEvent.isComposing || event.altKey) return null;
  if (event.ctrlKey || event.metaKey) return historyWish(event);
  const { row, column } = at;
  switch (event.key) {
    case 'ArrowUp':
      return { kind: 'move', to: { row: row - 1, column } };
    case 'ArrowDown':
      return { kind: 'move', to: { row: row + 1, column } };
    case 'Enter':
      return { kind: 'move', to: { row: event.shiftKey ? row - 1 : row + 1, column } };
    case 'ArrowLeft':
      return !event.shiftKey && caretAt(event.currentTarget, 0)
        ? { kind: 'move', to: { row, column: column - 1 } }
        : null;
    case 'ArrowRight':
      return !event.shiftKey && caretAt(event.currentTarget, event.currentTarget.value.length)
        ? { kind: 'move', to: { row, column: column + 1 } }
        : null;
    default:
      return null;
  }
}

function historyWish(event: KeyboardEvent): KeyWish {
  const key = event.key.toLowerCase();
  if (key === 'z') return { kind: event.shiftKey ? 'redo' : 'undo' };
  return key === 'y' ? { kind: 'redo' } : null;
}

function caretAt(input: HTMLInputElement, position: number): boolean {
  const { selectionStart, selectionEnd, value } = input;
  const allSelected = selectionStart === 0 && selectionEnd === value.length;
  return allSelected || (selectionStart === position && selectionEnd === position);
}
