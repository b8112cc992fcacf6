import type { Design } from '@shared/design';
import type { Counters, Look, Moment, Stage, Surface, Window } from '@shared/pattern';
import type { Probe } from './probe';

/** Which piece of a design a picture is of. */
export interface Subject {
  /** Number under which the worker was given the design. */
  readonly design: number;
  /** The bar and state; absent: the result as it is in the end. */
  readonly at?: Moment;
  readonly surface: Surface;
}

/** A picture to be made. */
export interface PictureTask extends Subject {
  /** The part of the surface that fills the picture; absent: all of it. */
  readonly window?: Window;
  readonly widthPx: number;
  readonly heightPx: number;
  /** Samples in a pixel where its neighbours differ, 1–16. */
  readonly samples: number;
  readonly look: Look;
  /** Whether copper, too, is shown in grey. */
  readonly isGrey?: boolean;
  /** A newer job in the same lane stops the older one. */
  readonly lane: string;
  /** Among lanes, the lowest goes first. */
  readonly rank: number;
  /** Whether the next picture in the lane will be much like this one: keeps what can be taken over. */
  readonly isKept?: boolean;
}

/** A place of a surface that is asked about. */
export interface ProbeTask extends Subject {
  /** 0–1 from the left and from the lower edge of the whole surface. */
  readonly across: number;
  readonly up: number;
}

interface Envelope<K extends string, P> {
  /** Answers carry the number of what they answer. */
  readonly requestId: number;
  readonly kind: K;
  readonly payload: P;
}

/** What the page asks of the worker. */
export type Request =
  /** Here is a design, known by this number from now on. */
  | Envelope<'design', { readonly key: number; readonly design: Design }>
  /** The design is asked for no more. */
  | Envelope<'forget', { readonly key: number }>
  | Envelope<'picture', PictureTask>
  | Envelope<'probe', ProbeTask>
  /** Stops the job of this number. */
  | Envelope<'stop', null>
  /** Stops what runs in a lane and lets go of what was kept for it. */
  | Envelope<'release', { readonly lane: string }>;

/** A picture so far: coarse first, then finer; whole at every stage. */
export interface PicturePart {
  /** `done`: there is nothing left to refine. */
  readonly stage: Stage;
  readonly widthPx: number;
  readonly heightPx: number;
  /** Red, green, blue, opacity, row by row from the top left. */
  readonly pixels: Uint8ClampedArray<ArrayBuffer>;
  readonly counters: Counters;
}

/** Why there is no picture. */
export type FailureCode =
  /** A step on the way to that state is refused, so there is nothing to be seen. */
  | 'no-state'
  /** The worker failed: `message` is for the log. */
  | 'broken';

export interface Failure {
  readonly code: FailureCode;
  readonly message: string;
}

/** What the worker answers. */
export type Answer =
  | Envelope<'picture', PicturePart>
  /** Null: there is no metal. */
  | Envelope<'probe', Probe | null>
  | Envelope<'failed', Failure>;
