import type { GestureEnd } from './contract';
import type { PointPx, Viewport } from './viewport';

/** Keys held while a pointer acts. */
export interface Modifiers {
  /** Shift: from the anchor to here. */
  readonly extends: boolean;
  /** Ctrl or Cmd: this one more or less. */
  readonly toggles: boolean;
  /** Alt: nothing snaps. */
  readonly isFree: boolean;
}

export type PointerDevice = 'mouse' | 'pen' | 'touch';

/** What happens to a drawing, free of the browser's events. */
export type ToolInput =
  | {
      readonly kind: 'press';
      readonly pointer: number;
      readonly device: PointerDevice;
      readonly button: 'main' | 'middle' | 'other';
      readonly at: PointPx;
      readonly modifiers: Modifiers;
    }
  | {
      readonly kind: 'move' | 'release';
      readonly pointer: number;
      readonly at: PointPx;
      readonly modifiers: Modifiers;
    }
  /** A finger stayed where it pressed for {@link HOLD_MS}. */
  | { readonly kind: 'hold'; readonly pointer: number }
  /** The browser took the pointer away, to scroll the page say. */
  | { readonly kind: 'lost'; readonly pointer: number }
  /** Escape, or an undo in the middle of a gesture. */
  | { readonly kind: 'abort' };

/** What a tool asks for, in this order. */
export type ToolOutput<Gesture, Choice> =
  | { readonly kind: 'start' }
  | { readonly kind: 'edit'; readonly gesture: Gesture }
  | { readonly kind: 'end'; readonly end: GestureEnd }
  | { readonly kind: 'select'; readonly selection: Choice }
  | { readonly kind: 'view'; readonly viewport: Viewport };

/** How long a finger rests before it takes something up, ms. Shorter, and the page could not be scrolled from here. */
export const HOLD_MS = 380;
/** A pointer that moved no further than this has clicked, px. */
export const CLICK_PX = 4;
/** The same for a finger. */
export const TAP_PX = 10;

export function isBeyond(a: PointPx, b: PointPx, px: number): boolean {
  return Math.hypot(a.xPx - b.xPx, a.yPx - b.yPx) > px;
}
