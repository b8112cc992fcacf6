import type { StackGesture } from './contract';
import { NOTHING_SELECTED, type Selection, everything, movedAlong, only, rangeTo } from './selection';

/** A key pressed on a drawing. */
export interface KeyPress {
  readonly key: string;
  readonly shift: boolean;
  readonly alt: boolean;
  /** Ctrl or Cmd. */
  readonly command: boolean;
}

/** What a key asks for. A gesture is whole: it starts, edits once and settles. */
export type KeyOutput =
  | { readonly kind: 'select'; readonly selection: Selection }
  | { readonly kind: 'gesture'; readonly gesture: StackGesture; readonly selection: Selection }
  | { readonly kind: 'zoom'; readonly factor: number }
  | { readonly kind: 'fit' };

/** Each press of + or − changes the scale by this. */
export const ZOOM_STEP = 1.25;

/**
 * What a key does on the stack: arrows go up and down (with Shift the choice grows, with Alt the chosen layers move),
 * Home and End go to the ends, Ctrl+A takes all, Escape nothing, + and − zoom, 0 fits. Null: the key is not ours.
 */
export function stackKey(press: KeyPress, count: number, selection: Selection): KeyOutput | null {
  if (press.command) {
    return press.key.toLowerCase() === 'a' && !press.shift && !press.alt
      ? { kind: 'select', selection: everything(count, selection) }
      : null;
  }
  switch (press.key) {
    case 'ArrowUp':
      return press.alt ? movedBy(1, count, selection) : wentTo(next(selection, 1, count), press, selection);
    case 'ArrowDown':
      return press.alt ? movedBy(-1, count, selection) : wentTo(next(selection, -1, count), press, selection);
    case 'Home':
      return press.alt ? null : wentTo(0, press, selection);
    case 'End':
      return press.alt ? null : wentTo(count - 1, press, selection);
    case 'Escape':
      return selection.places.size > 0 ? { kind: 'select', selection: NOTHING_SELECTED } : null;
    case '+':
    case '=':
      return press.alt ? null : { kind: 'zoom', factor: ZOOM_STEP };
    case '-':
    case '−':
    case '_':
      return press.alt ? null : { kind: 'zoom', factor: 1 / ZOOM_STEP };
    case '0':
      return press.alt ? null : { kind: 'fit' };
    default:
      return null;
  }
}

function wentTo(place: number, press: KeyPress, selection: Selection): KeyOutput {
  return { kind: 'select', selection: press.shift ? rangeTo(selection, place) : only(place) };
}

/** From nothing, up begins at the bottom and down at the top. */
function next(selection: Selection, by: 1 | -1, count: number): number {
  if (selection.cursor === null) return by === 1 ? 0 : count - 1;
  return Math.min(count - 1, Math.max(0, selection.cursor + by));
}

/** The chosen layers one place up or down; layers that lie apart come together first. */
function movedBy(by: 1 | -1, count: number, selection: Selection): KeyOutput | null {
  const { places } = selection;
  if (places.size === 0) return null;
  const first = Math.min(...places);
  const last = Math.max(...places);
  const isApart = last - first + 1 > places.size;
  if (!isApart && (by === 1 ? last === count - 1 : first === 0)) return null;
  const to = by === 1 ? Math.min(count, last + (isApart ? 1 : 2)) : Math.max(0, first - (isApart ? 0 : 1));
  return { kind: 'gesture', gesture: { kind: 'move', places, to }, selection: movedAlong(selection, to) };
}
