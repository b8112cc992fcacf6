/** One of the six sides of a bar. */
export const FACES = ['top', 'bottom', 'left', 'right', 'near', 'far'] as const;
export type Face = (typeof FACES)[number];

/**
 * What of a bar is looked at. A face, ground `depthMm` deep; a cut at a right angle to the length or the width; one side
 * of the ground blade.
 *
 * Pictures lie as follows. Top, bottom, left and right and the cut across the width show x to the right; the ends and the cut across
 * the length show y to the right. z, or y on top and bottom, runs upward from the lower edge. The bottom is seen through
 * the bar, so that depth 0 at the bottom and the whole thickness at the top are one picture. The blade shows its tip to
 * the right and its edge below, whichever side is seen.
 */
export type Surface =
  | { readonly kind: 'face'; readonly face: Face; readonly depthMm: number }
  | { readonly kind: 'section'; readonly across: 'length' | 'width'; readonly atMm: number }
  | { readonly kind: 'blade'; readonly side: 'left' | 'right' };

/** A part of a surface's picture: 0–1 from its left and lower edge. */
export interface Window {
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
  readonly top: number;
}

export const WHOLE: Window = { left: 0, bottom: 0, right: 1, top: 1 };

/** Where the points of a surface are put. */
export interface SurfacePoints {
  readonly x: Float32Array | Float64Array;
  readonly y: Float32Array | Float64Array;
  readonly z: Float32Array | Float64Array;
  /** 1 where there is metal, 0 where the surface has none; such points lie somewhere in the bar all the same. */
  readonly isMetal: Uint8Array;
  /** Slope of the surface towards the upper edge of the picture, mm per mm: 0 on a flat, positive where it rises. */
  readonly slope: Float32Array;
}

/** A surface laid out flat. */
export interface SurfaceMap {
  /** Size of what the whole picture shows, mm. */
  readonly widthMm: number;
  readonly heightMm: number;
  /** Whether the whole picture is flat metal: then `place` leaves `isMetal` and `slope` as they are. */
  readonly isFlat: boolean;
  /**
   * Puts the points for `count` places of the picture.
   * @param across 0–1 from the left edge
   * @param up 0–1 from the lower edge
   */
  place(across: Float64Array, up: Float64Array, count: number, points: SurfacePoints): void;
}
