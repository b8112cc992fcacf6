/**
 * What the drawings of the editor tell the page that holds them.
 *
 * A gesture runs `gestureStart`, any number of `gestureEdit`, `gestureEnd`. Each edit says where the gesture stands now,
 * relative to the document as it was at `gestureStart`, so the later one replaces the earlier. `abort` means: as if it
 * had never begun. What the keys do on a drawing comes as a whole gesture at once.
 */
export type StackGesture =
  /**
   * Layers, kept in their order, go to before the layer that was at `to` when the gesture began; `to` = number of
   * layers: to the top. Places count from 0 at the bottom.
   */
  | { readonly kind: 'move'; readonly places: ReadonlySet<number>; readonly to: number }
  /** The layer at `place` gets a new thickness, mm. */
  | { readonly kind: 'thickness'; readonly place: number; readonly thicknessMm: number }
  /** A layer of the steel is laid in so that it gets the place `at`; how thick it is, the page decides. */
  | { readonly kind: 'insert'; readonly at: number; readonly steel: string };

/** A gesture on the pieces of an assembly; places count from 0 at the bottom or at the left. */
export type AssemblyGesture =
  /** The piece goes to before the one that was at `to` when the gesture began; `to` = number of pieces: to the end. */
  | { readonly kind: 'move'; readonly place: number; readonly to: number }
  /** The piece gets this many quarter turns in all, each taking its top to the right. */
  | { readonly kind: 'turn'; readonly place: number; readonly quarterTurns: 0 | 1 | 2 | 3 }
  /** The piece is laid end for end, or not. */
  | { readonly kind: 'end-for-end'; readonly place: number; readonly endForEnd: boolean }
  /** A piece of the bar is laid in so that it gets the place `at`. */
  | { readonly kind: 'insert'; readonly at: number; readonly bar: string }
  /** Pieces lie on top of each other (`thickness`) or side by side (`width`). */
  | { readonly kind: 'along'; readonly along: 'thickness' | 'width' };

/** How a gesture ends: its last edit stays, or nothing of it does. */
export type GestureEnd = 'settle' | 'abort';

/** Type of the data that is dragged from the catalogue of steels onto a stack: the steel's id. */
export const STEEL_DRAG_TYPE = 'application/x-layerwright-steel';

/** Type of the data that is dragged from the list of bars onto an assembly: the bar's id. */
export const BAR_DRAG_TYPE = 'application/x-layerwright-bar';
