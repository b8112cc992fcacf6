import type { AffineOp, DimpleOp, GrooveOp, TraceOp, UnevenOp } from '../../bar/index.js';
import { rimRadiusMm } from '../../steps/index.js';
import { OP, type OpCode } from './program.js';
import type { Wave } from './waves.js';

/** An op as the program holds it. */
export interface EncodedOp {
  readonly code: OpCode;
  readonly params: readonly number[];
}

/** How uneven the hammer was in one draw. */
export interface Unevenness {
  /** 0–1; 0 leaves the op out. */
  readonly strength: number;
  readonly waves: readonly Wave[];
}

/** Greatest displacement along z by unevenness 1, as a part of the thickness. Common practice, no source. */
const UNEVEN_SHARE = 0.1;
/** Greatest displacement in the plane by unevenness 1: part of the smaller side, and in mm. */
const UNEVEN_FLAT_SHARE = 0.05;
const UNEVEN_FLAT_MM = 1.5;
/** How the waves share the displacement along z. */
const WAVE_WEIGHTS = [0.5, 0.3, 0.2] as const;

/** How far, in rows and columns, a dimple may lie from the place that is asked about. */
const MAX_REACH = 12;
/** How far a scattered dimple strays from its place, as a part of each pitch; see the step's lattice. */
const STRAY = 0.35;

/** The op with its constants worked out, or null when it changes nothing. */
export function encode(op: TraceOp, unevenness: Unevenness): EncodedOp | null {
  switch (op.op) {
    case 'affine':
      return { code: OP.affine, params: affineParams(op) };
    case 'restack':
      return {
        code: OP.restack,
        params: [
          op.pieceThicknessMm,
          1 / op.pieceThicknessMm,
          op.pieces - 1,
          op.stepMm,
          op.widthMm,
          op.isTurned ? 1 : 0,
        ],
      };
    case 'fold':
      return { code: OP.fold, params: [op.halfThicknessMm, 2 * op.halfThicknessMm, op.lengthMm] };
    case 'slice':
      return {
        code: OP.slice,
        params: [op.tileMm, 1 / op.tileMm, op.count - 1, op.stepMm, op.widthMm, op.isTurned ? 1 : 0],
      };
    case 'twist': {
      const quartersPerMm = op.radPerMm / (Math.PI / 2);
      return {
        code: OP.twist,
        params: [op.widthMm / 2, op.thicknessMm / 2, quartersPerMm, op.reversalMm, op.isReversed ? 1 : 0],
      };
    }
    case 'corner':
      return { code: OP.corner, params: [op.widthMm / 2, op.thicknessMm / 2] };
    case 'groove':
      return { code: OP.groove, params: grooveParams(op) };
    case 'dimple':
      return { code: OP.dimple, params: dimpleParams(op) };
    case 'wedge':
      return { code: OP.wedge, params: [op.thicknessMm, op.middleMm, op.dragMm, 1 / op.reachMm] };
    case 'uneven':
      return unevenness.strength > 0 ? { code: OP.uneven, params: unevenParams(op, unevenness) } : null;
  }
}

/** Nine numbers: where each axis is read from, its scale, its shift. */
export function affineParams({ from, scale, shiftMm }: AffineOp): readonly number[] {
  return [...from, ...scale, ...shiftMm];
}

function grooveParams(op: GrooveOp): readonly number[] {
  const cos = Math.cos(op.slantRad);
  return [
    1 / op.thicknessMm,
    op.topMm,
    op.topSign,
    op.bottomMm,
    op.bottomSign,
    op.isBottomShifted ? 0.5 : 0,
    op.radiusMm * op.radiusMm,
    op.depthMm - op.radiusMm,
    1 / op.pitchMm,
    op.pitchMm * cos,
    Math.tan(op.slantRad),
    op.middleMm,
  ];
}

function dimpleParams(op: DimpleOp): readonly number[] {
  const { pitchMm, rowPitchMm } = op;
  const isScattered = op.layout === 'scattered';
  const rimMm = rimRadiusMm(op.radiusMm, op.depthMm);
  // Past this distance either nothing is cut or another dimple is nearer.
  const stray = isScattered ? 0.5 + STRAY : 0.5;
  const nearMm = Math.min(rimMm, Math.hypot(stray * pitchMm, stray * rowPitchMm));
  const reach = (pitch: number): number =>
    Math.max(0, Math.min(MAX_REACH, Math.ceil(nearMm / pitch + (isScattered ? STRAY : 0) - 0.5)));
  return [
    1 / op.thicknessMm,
    op.topMm,
    op.topSign,
    op.bottomMm,
    op.bottomSign,
    op.isBottomShifted ? 0.5 : 0,
    op.radiusMm * op.radiusMm,
    op.depthMm - op.radiusMm,
    1 / pitchMm,
    pitchMm,
    1 / rowPitchMm,
    rowPitchMm,
    op.middleMm,
    op.layout === 'staggered' ? 0.5 : 0,
    isScattered ? 2 * STRAY : 0,
    op.seed,
    isScattered ? reach(pitchMm) : 0,
    op.layout === 'square' ? 0 : reach(rowPitchMm),
  ];
}

function unevenParams(op: UnevenOp, { strength, waves }: Unevenness): readonly number[] {
  const { lengthMm, widthMm, thicknessMm } = op;
  const flatMm = (side: number): number =>
    strength * Math.min(UNEVEN_FLAT_SHARE * Math.min(side, 2 * thicknessMm), UNEVEN_FLAT_MM);
  return [
    1 / lengthMm,
    1 / widthMm,
    1 / thicknessMm,
    4 * flatMm(lengthMm),
    4 * flatMm(widthMm),
    4 * strength * UNEVEN_SHARE * thicknessMm,
    ...waves.flatMap((wave, i) => [
      wave.turnsPerMmX,
      wave.turnsPerMmY,
      wave.startTurns,
      WAVE_WEIGHTS[i] as number,
    ]),
  ];
}
