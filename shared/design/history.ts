/**
 * Undo and redo over a value that is never changed in place: each entry is the earlier value itself. Parts that an
 * edit left alone are shared between the entries, so depth costs what the edits changed.
 *
 * A gesture (a drag, a run of key presses) opens a mark; however many edits it makes, it is one entry, and dropping it
 * gives back value and redo as they were.
 */
export interface History<T> {
  readonly past: readonly T[];
  readonly present: T;
  readonly future: readonly T[];
  /** What the open gesture started from; null outside a gesture. */
  readonly mark: { readonly present: T; readonly future: readonly T[] } | null;
}

/** How many steps back are kept. */
export const HISTORY_DEPTH = 500;

export function startHistory<T>(present: T): History<T> {
  return { past: [], present, future: [], mark: null };
}

/** A new present. Outside a gesture it is an entry of its own; what could be redone is gone. The same value changes nothing. */
export function edited<T>(history: History<T>, present: T): History<T> {
  if (present === history.present) return history;
  if (history.mark) return { ...history, present, future: [] };
  return { past: grown(history.past, history.present), present, future: [], mark: null };
}

/** Opens a gesture; an open one goes on. */
export function marked<T>(history: History<T>): History<T> {
  return history.mark ? history : { ...history, mark: { present: history.present, future: history.future } };
}

/** Closes the gesture: all its edits become one entry, none if it changed nothing. */
export function settled<T>(history: History<T>): History<T> {
  const { mark } = history;
  if (mark === null) return history;
  if (mark.present === history.present) return { ...history, future: mark.future, mark: null };
  return { ...history, past: grown(history.past, mark.present), mark: null };
}

/** Drops the gesture: value and redo are as they were when it began. */
export function aborted<T>(history: History<T>): History<T> {
  const { mark } = history;
  return mark === null ? history : { ...history, present: mark.present, future: mark.future, mark: null };
}

/** One step back; an open gesture is dropped instead. */
export function undone<T>(history: History<T>): History<T> {
  if (history.mark) return aborted(history);
  const earlier = history.past[history.past.length - 1];
  if (earlier === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: earlier,
    future: [history.present, ...history.future],
    mark: null,
  };
}

/** One step forward again. */
export function redone<T>(history: History<T>): History<T> {
  const [next, ...rest] = history.future;
  if (next === undefined || history.mark) return history;
  return { past: grown(history.past, history.present), present: next, future: rest, mark: null };
}

export function canUndo(history: History<unknown>): boolean {
  return history.past.length > 0 || history.mark !== null;
}

export function canRedo(history: History<unknown>): boolean {
  return history.future.length > 0 && history.mark === null;
}

function grown<T>(past: readonly T[], value: T): readonly T[] {
  return [...past.slice(-(HISTORY_DEPTH - 1)), value];
}
