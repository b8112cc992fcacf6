/** What a key asks of the whole editor. */
export type KeyCommand = 'undo' | 'redo' | 'shortcuts';

/** The command of a key press; null where the key belongs to whatever has the focus. */
export function keyCommand(event: KeyboardEvent): KeyCommand | null {
  if (event.defaultPrevented || event.altKey) return null;
  const key = event.key.toLowerCase();
  if (event.ctrlKey || event.metaKey) {
    if (key !== 'z' && key !== 'y') return null;
    if (hasOwnUndo(event.target)) return null;
    if (key === 'y') return event.shiftKey ? null : 'redo';
    return event.shiftKey ? 'redo' : 'undo';
  }
  return event.key === '?' && !takesText(event.target) ? 'shortcuts' : null;
}

/** Text that is being typed and not yet an edit of the design is undone by the browser. */
function hasOwnUndo(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target instanceof HTMLTextAreaElement) return true;
  return target instanceof HTMLInputElement && target.dataset['typed'] !== undefined;
}

function takesText(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target.isContentEditable || target instanceof HTMLTextAreaElement) return true;
  return target instanceof HTMLInputElement && !['checkbox', 'radio', 'button'].includes(target.type);
}
