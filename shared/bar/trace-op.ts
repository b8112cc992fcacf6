import type { BarState, Removal } from './bar-state.js';

/**
 * How to take a point of a bar back to where it was before a step. Each op maps (x, y, z) of the later bar to (x, y, z)
 * of the earlier one, mm: x along the length from the near end, y across the width from the left side, z through the
 * thickness from the bottom. A step is a list of ops, the one to apply first coming first.
 *
 * Ops are plain data. What they mean is written down once more, in arithmetic, in `shared/pattern`.
 */
export type TraceOp =
  AffineOp | RestackOp | FoldOp | SliceOp | TwistOp | CornerOp | GrooveOp | DimpleOp | WedgeOp | UnevenOp;

/** 0: x, 1: y, 2: z. */
export type AxisIndex = 0 | 1 | 2;

/**
 * Axes exchanged, scaled and shifted: earlier[i] = scale[i] · later[from[i]] + shiftMm[i]. Sizes, removals and turns are
 * all of this form, and two in a row are one.
 */
export interface AffineOp {
  readonly op: 'affine';
  readonly from: readonly [AxisIndex, AxisIndex, AxisIndex];
  readonly scale: readonly [number, number, number];
  readonly shiftMm: readonly [number, number, number];
}

/**
 * Pieces lie on each other: k = ⌊z / pieceThicknessMm⌋ names the piece; z falls by k pieces, x grows by k·stepMm. Every
 * second piece of `turned` ones was turned over about its length: y = widthMm − y, z = pieceThicknessMm − z.
 */
export interface RestackOp {
  readonly op: 'restack';
  readonly pieces: number;
  readonly pieceThicknessMm: number;
  /** Length of a piece and a saw cut. */
  readonly stepMm: number;
  readonly widthMm: number;
  readonly isTurned: boolean;
}

/** The upper half is the far half come over: z is mirrored at the seam, x = lengthMm − x. */
export interface FoldOp {
  readonly op: 'fold';
  readonly halfThicknessMm: number;
  /** Length before the fold. */
  readonly lengthMm: number;
}

/**
 * Slices lie in a row, end grain up: k = ⌊x / tileMm⌋ names the slice; inside it x and z change places and x grows by
 * k·stepMm. Every second one of `turned` ones was turned half round in its plane: x = tileMm − x, y = widthMm − y.
 */
export interface SliceOp {
  readonly op: 'slice';
  readonly count: number;
  /** Length that a slice takes up: the thickness of the bar it came from. */
  readonly tileMm: number;
  /** Thickness of a slice and a saw cut. */
  readonly stepMm: number;
  readonly widthMm: number;
  readonly isTurned: boolean;
}

/**
 * The section is turned about its middle by the turns up to x. The angle grows by `radPerMm`; every `reversalMm` along
 * the bar it turns back on itself. Positive is a right-hand twist: seen from the near end the top goes to the right on
 * the way to the far end, and on a plane `h` over the axis, `s` to the right of it, the earlier height over the axis is
 * h·cos ψ + s·sin ψ.
 */
export interface TwistOp {
  readonly op: 'twist';
  readonly widthMm: number;
  readonly thicknessMm: number;
  readonly radPerMm: number;
  readonly reversalMm: number;
  /** Whether it turns back at all. */
  readonly isReversed: boolean;
}

/** The section turned by 45° and squared again. */
export interface CornerOp {
  readonly op: 'corner';
  readonly widthMm: number;
  readonly thicknessMm: number;
}

/**
 * Each column of metal fills the thickness: z = bottom + z/thicknessMm · (top − bottom), where top and bottom are
 * heights in the earlier bar that follow the relief of the two faces. Metal moves straight up and down and not sideways:
 * the whole volume is kept exactly, that of a single layer within a few hundredths of it (a groove of a sixth of the
 * thickness: 3 %).
 */
export interface ReliefColumn {
  /** Of the later bar. */
  readonly thicknessMm: number;
  /** Height of the later top face in the earlier bar where there is no relief. */
  readonly topMm: number;
  /** What a relief depth of 1 mm adds to that height: −1 cut and forged flat, 1 pressed and ground, 0 not worked. */
  readonly topSign: -1 | 0 | 1;
  readonly bottomMm: number;
  readonly bottomSign: -1 | 0 | 1;
  /** Whether the bottom's relief lies half a pitch along. */
  readonly isBottomShifted: boolean;
  readonly depthMm: number;
  readonly radiusMm: number;
  readonly pitchMm: number;
  /** The middle of the width, from which slants and rows count. */
  readonly middleMm: number;
}

/**
 * Round-bottomed grooves. Their middles lie at (k + ½)·pitch along p = x + (y − middle)·tan(slant), shifted ones at
 * k·pitch.
 */
export interface GrooveOp extends ReliefColumn {
  readonly op: 'groove';
  readonly slantRad: number;
}

/** Round pits, on the lattice of the `dimple` step. */
export interface DimpleOp extends ReliefColumn {
  readonly op: 'dimple';
  readonly rowPitchMm: number;
  readonly layout: 'square' | 'staggered' | 'scattered';
  readonly seed: number;
}

/**
 * Layers dragged down into a lengthwise cut: z = z + dragMm · exp(−|y − middleMm| / reachMm). Heights past the top count
 * on from the bottom: what the wedge pushes out below is taken to fill the notch that it leaves above, so that every
 * layer keeps its volume and no point leaves the bar.
 */
export interface WedgeOp {
  readonly op: 'wedge';
  readonly thicknessMm: number;
  readonly middleMm: number;
  readonly dragMm: number;
  readonly reachMm: number;
}

/** A smooth displacement inside a bar of this size, as uneven as the design says; its faces stay faces. */
export interface UnevenOp {
  readonly op: 'uneven';
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
}

const SAME_AXES = [0, 1, 2] as const;

/** Changes nothing. */
export const IDENTITY_OP: AffineOp = { op: 'affine', from: SAME_AXES, scale: [1, 1, 1], shiftMm: [0, 0, 0] };

/** From a bar to one of another size with the same contents, pressed or drawn. */
export function resizedBack(later: BarState, earlier: BarState): AffineOp {
  const scale = [
    earlier.lengthMm / later.lengthMm,
    earlier.widthMm / later.widthMm,
    earlier.thicknessMm / later.thicknessMm,
  ] as const;
  return { ...IDENTITY_OP, scale };
}

/** Puts back what was taken off. */
export function removalBack(removal: Pick<Removal, 'near' | 'left' | 'bottom'>): AffineOp {
  return { ...IDENTITY_OP, shiftMm: [removal.near, removal.left, removal.bottom] };
}

/**
 * Undoes one quarter turn about the length (new y = old z, new z = W − old y).
 * @param laterThicknessMm thickness after the turn, which was the width before it
 */
export function quarterTurnBack(laterThicknessMm: number): AffineOp {
  return { op: 'affine', from: [0, 2, 1], scale: [1, -1, 1], shiftMm: [0, laterThicknessMm, 0] };
}

/**
 * Undoes standing the bar on its end (new x = old z, new z = L − old x).
 * @param laterThicknessMm thickness after it, which was the length before
 */
export function standingBack(laterThicknessMm: number): AffineOp {
  return { op: 'affine', from: [2, 1, 0], scale: [-1, 1, 1], shiftMm: [laterThicknessMm, 0, 0] };
}

/** Undoes half a turn about the thickness axis, which is its own inverse. */
export function endForEndBack(lengthMm: number, widthMm: number): AffineOp {
  return { op: 'affine', from: SAME_AXES, scale: [-1, -1, 1], shiftMm: [lengthMm, widthMm, 0] };
}

/** One op that does what `first` and then `second` do. */
export function mergedAffine(first: AffineOp, second: AffineOp): AffineOp {
  const at = (i: AxisIndex): { from: AxisIndex; scale: number; shiftMm: number } => {
    const axis = second.from[i];
    return {
      from: first.from[axis],
      scale: second.scale[i] * first.scale[axis],
      shiftMm: second.scale[i] * first.shiftMm[axis] + second.shiftMm[i],
    };
  };
  const [x, y, z] = [at(0), at(1), at(2)];
  return {
    op: 'affine',
    from: [x.from, y.from, z.from],
    scale: [x.scale, y.scale, z.scale],
    shiftMm: [x.shiftMm, y.shiftMm, z.shiftMm],
  };
}

/** Whether the op changes nothing at all. */
export function isIdentity({ from, scale, shiftMm }: AffineOp): boolean {
  return from.every((axis, i) => axis === i) && scale.every((s) => s === 1) && shiftMm.every((s) => s === 0);
}
