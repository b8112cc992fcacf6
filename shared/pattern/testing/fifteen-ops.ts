import type { GrooveOp, TraceOp } from '../../bar/index.js';
import { rimRadiusMm } from '../../steps/index.js';
import { encode } from '../program/encode.js';
import { type Program, START } from '../program/program.js';

/** Size of the bar that the fifteen ops lead back from, mm. */
const LENGTH_MM = 300;
const WIDTH_MM = 40;
const THICKNESS_MM = 12;

/** Three times groove, size, twist, restack and fold: the list that engines are measured by. */
export const FIFTEEN_OPS: readonly TraceOp[] = [0, 1, 2].flatMap((round): readonly TraceOp[] => [
  grooveOp(10 + round),
  { op: 'affine', from: [0, 1, 2], scale: [0.5, 1, 2], shiftMm: [1, 0, 0] },
  { op: 'twist', widthMm: 40, thicknessMm: 24, radPerMm: 0.12, reversalMm: 600, isReversed: false },
  { op: 'restack', pieces: 3, pieceThicknessMm: 8, stepMm: 151.5, widthMm: 40, isTurned: true },
  { op: 'fold', halfThicknessMm: 4, lengthMm: 454.5 },
]);

function grooveOp(pitchMm: number): GrooveOp {
  return {
    op: 'groove',
    thicknessMm: THICKNESS_MM,
    topMm: 14,
    topSign: -1,
    bottomMm: 0,
    bottomSign: 0,
    isBottomShifted: false,
    depthMm: 3,
    radiusMm: 4,
    pitchMm,
    middleMm: 20,
    slantRad: 0.2,
  };
}

/** The fifteen ops as a program over a stack of fifteen layers. */
export function fifteenOps(): Program {
  const code: number[] = [];
  const params: number[] = [];
  for (const op of FIFTEEN_OPS) {
    const encoded = encode(op, { strength: 0, waves: [] });
    if (encoded === null) continue;
    code.push(encoded.code, params.length);
    params.push(...encoded.params);
  }
  const layers = 15;
  const places = Array.from({ length: layers }, (_, i) => i);
  return {
    code: Int32Array.from(code),
    params: Float64Array.from(params),
    segments: Int32Array.of(0, FIFTEEN_OPS.length, START.stack, 0, layers),
    pieces: new Int32Array(0),
    entry: 0,
    layerTopMm: Float64Array.from(places, (i) => ((i + 1) * 4) / layers),
    layerSteel: Uint16Array.from(places, (i) => i % 2),
    layerBar: new Uint16Array(layers),
    layerPlace: Uint16Array.from(places),
    steelIds: ['1084', '15n20'],
    barIds: ['billet'],
    lengthMm: LENGTH_MM,
    widthMm: WIDTH_MM,
    thicknessMm: THICKNESS_MM,
    folds: 8,
  };
}

interface Point {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}
type Back = (point: Point) => Point;

/** The same fifteen ops as functions from point to point: how one would write it without thinking of speed. */
export function fifteenClosures(): Back {
  const steps = FIFTEEN_OPS.map(closureOf);
  return (point) => steps.reduce((at, back) => back(at), point);
}

function closureOf(op: TraceOp): Back {
  switch (op.op) {
    case 'affine':
      return ({ x, y, z }) => ({
        x: x * op.scale[0] + op.shiftMm[0],
        y: y * op.scale[1] + op.shiftMm[1],
        z: z * op.scale[2] + op.shiftMm[2],
      });
    case 'restack':
      return ({ x, y, z }) => {
        const k = Math.max(0, Math.min(op.pieces - 1, Math.floor(z / op.pieceThicknessMm)));
        const inPiece = z - k * op.pieceThicknessMm;
        const isOver = op.isTurned && k % 2 === 1;
        return {
          x: x + k * op.stepMm,
          y: isOver ? op.widthMm - y : y,
          z: isOver ? op.pieceThicknessMm - inPiece : inPiece,
        };
      };
    case 'fold':
      return ({ x, y, z }) =>
        z > op.halfThicknessMm ? { x: op.lengthMm - x, y, z: 2 * op.halfThicknessMm - z } : { x, y, z };
    case 'groove':
      return ({ x, y, z }) => {
        const along = (x + (y - op.middleMm) * Math.tan(op.slantRad)) / op.pitchMm;
        const offset = (along - Math.floor(along) - 0.5) * op.pitchMm * Math.cos(op.slantRad);
        const isCut = Math.abs(offset) < rimRadiusMm(op.radiusMm, op.depthMm);
        const depth = isCut ? op.depthMm - op.radiusMm + Math.sqrt(op.radiusMm ** 2 - offset ** 2) : 0;
        return { x, y, z: (z / op.thicknessMm) * (op.topMm - depth) };
      };
    case 'twist':
      return twistClosure(op.widthMm / 2, op.thicknessMm / 2, op.radPerMm);
    default:
      throw new RangeError(`closureOf: "${op.op}" is not among the fifteen`);
  }
}

/** The turn of `reference/turn-section.ts`, written for one point. */
function twistClosure(halfWidth: number, halfThickness: number, radPerMm: number): Back {
  return ({ x, y, z }) => {
    const quarters = (radPerMm * x) / (Math.PI / 2);
    const whole = Math.round(quarters);
    const v = Math.max(-1, Math.min(1, y / halfWidth - 1));
    const w = Math.max(-1, Math.min(1, z / halfThickness - 1));
    const ring = (1 - v * v) * (1 - w * w);
    const kk = Math.sqrt(ring);
    const g = 0.025 * kk ** 2 + 0.908 * kk + 0.067;
    const w2 = (quarters - whole) * (Math.PI / 2);
    const sin2 = Math.sin(w2) ** 2;
    const sn = Math.sin(w2) / Math.sqrt(g * Math.cos(2 * w2) + (1 + kk) * sin2);
    const cnDn = Math.sqrt(Math.max(0, (1 - sn * sn) * (1 - (1 - ring) * sn * sn)));
    const turnedV = (v * cnDn - sn * w * (1 - v * v)) / Math.max(1e-30, 1 - v * v * sn * sn);
    const turnedW = (w * cnDn + sn * v * (1 - w * w)) / Math.max(1e-30, 1 - w * w * sn * sn);
    const [yBack, zBack] = [
      [turnedV, turnedW],
      [-turnedW, turnedV],
      [-turnedV, -turnedW],
      [turnedW, -turnedV],
    ][whole & 3] as [number, number];
    return { x, y: (yBack + 1) * halfWidth, z: (zBack + 1) * halfThickness };
  };
}
