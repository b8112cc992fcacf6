import type { Bar, Design } from '../../design/index.js';
import { type ForgedBar, type Forging, cutPlanOf } from '../../forging/index.js';
import type { Step } from '../../steps/index.js';

/** A point of metal, mm, in the bar that it is in at the moment. */
export interface Point {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

type Size = { readonly lengthMm: number; readonly widthMm: number; readonly thicknessMm: number };

/**
 * Moves a point of a bar's stack forward, as the metal goes, to the end of the result; null when it is lost to scale, a
 * saw, a grinder or the trim bin. Written after the words of the step table, for the specs alone; knows the steps that don't bend.
 */
export function movedToResult(forging: Forging, barId: string, start: Point): Point | null {
  const { design } = forging;
  const bar = design.bars.find(({ id }) => id === barId) as Bar;
  const forged = forging.bars.find(({ id }) => id === barId) as ForgedBar;
  let point: Point | null = start;
  for (const [s, step] of bar.steps.entries()) {
    const before = (forged.states[s] as ForgedBar['states'][number]).bar;
    const after = (forged.states[s + 1] as ForgedBar['states'][number]).bar;
    point = movedByStep(forging, step, before, after, point);
    if (point === null) return null;
  }
  if (barId === design.result) return point;
  return movedIntoAssembly(forging, barId, point);
}

function movedIntoAssembly(forging: Forging, barId: string, point: Point): Point | null {
  const { design, allowances } = forging;
  const plan = cutPlanOf(design);
  const end = sizeOf(forging, barId);
  const pieces = plan.pieces.get(barId) ?? 0;
  if (pieces === 0) return null;
  const pieceMm = (end.lengthMm - (pieces - 1) * allowances.kerfMm) / pieces;
  const place = Math.floor(point.x / (pieceMm + allowances.kerfMm));
  const x = point.x - place * (pieceMm + allowances.kerfMm);
  if (x >= pieceMm) return null;
  for (const bar of design.bars) {
    if (bar.start.kind !== 'assembly') continue;
    const at = bar.start.pieces.findIndex(
      (piece, i) => piece.bar === barId && plan.places.get(bar.id)?.[i] === place,
    );
    if (at < 0) continue;
    const laid = laidIn(forging, bar, at, { ...point, x }, { ...end, lengthMm: pieceMm });
    return laid && movedToResult(forging, bar.id, laid);
  }
  return null;
}

function laidIn(forging: Forging, bar: Bar, at: number, point: Point, size: Size): Point | null {
  if (bar.start.kind !== 'assembly') return null;
  const piece = bar.start.pieces[at] as (typeof bar.start.pieces)[number];
  let { x, y, z } = point;
  let { widthMm, thicknessMm } = size;
  for (let turn = 0; turn < (piece.quarterTurns ?? 0); turn++) {
    [y, z] = [z, widthMm - y];
    [widthMm, thicknessMm] = [thicknessMm, widthMm];
  }
  if (piece.endForEnd) [x, y] = [size.lengthMm - x, widthMm - y];
  const whole = startSizeOf(forging, bar.id);
  if (x > whole.lengthMm) return null;
  let before = 0;
  for (let i = 0; i < at; i++) before += extentOf(forging, bar, i);
  if (bar.start.along === 'thickness') {
    y -= (widthMm - whole.widthMm) / 2;
    return y < 0 || y > whole.widthMm ? null : { x, y, z: z + before };
  }
  z -= (thicknessMm - whole.thicknessMm) / 2;
  return z < 0 || z > whole.thicknessMm ? null : { x, y: y + before, z };
}

/** Extent of piece `i` in the direction in which the pieces lie on each other. */
function extentOf(forging: Forging, bar: Bar, i: number): number {
  if (bar.start.kind !== 'assembly') return 0;
  const piece = bar.start.pieces[i] as (typeof bar.start.pieces)[number];
  const { widthMm, thicknessMm } = sizeOf(forging, piece.bar);
  const isOnEdge = (piece.quarterTurns ?? 0) % 2 === 1;
  return (bar.start.along === 'thickness') === isOnEdge ? widthMm : thicknessMm;
}

function movedByStep(forging: Forging, step: Step, before: Size, after: Size, point: Point): Point | null {
  const { allowances } = forging;
  if (step.isOff) return point;
  const scaleMm = (step.heats ?? 0) * allowances.scaleMmPerHeat;
  const left: Size = {
    lengthMm: before.lengthMm - 2 * scaleMm,
    widthMm: before.widthMm - 2 * scaleMm,
    thicknessMm: before.thicknessMm - 2 * scaleMm,
  };
  const x = point.x - scaleMm;
  const y = point.y - scaleMm;
  const z = point.z - scaleMm;
  if (!isIn({ x, y, z }, left)) return null;
  switch (step.kind) {
    case 'weld':
    case 'draw':
      return {
        x: (x * after.lengthMm) / left.lengthMm,
        y: (y * after.widthMm) / left.widthMm,
        z: (z * after.thicknessMm) / left.thicknessMm,
      };
    case 'restack': {
      const grindMm = step.grindPerFaceMm ?? allowances.seamGrindMm;
      const pieceMm = (left.lengthMm - (step.pieces - 1) * allowances.kerfMm) / step.pieces;
      const k = Math.floor(x / (pieceMm + allowances.kerfMm));
      const inPiece = x - k * (pieceMm + allowances.kerfMm);
      const height = left.thicknessMm - 2 * grindMm;
      const ground = z - grindMm;
      if (inPiece > pieceMm || ground < 0 || ground > height) return null;
      const isOver = step.turnAlternate && k % 2 === 1;
      return {
        x: inPiece,
        y: isOver ? left.widthMm - y : y,
        z: k * height + (isOver ? height - ground : ground),
      };
    }
    case 'fold': {
      const height = left.thicknessMm - (step.grindPerFaceMm ?? allowances.seamGrindMm);
      if (z > height) return null;
      return x <= left.lengthMm / 2 ? { x, y, z } : { x: left.lengthMm - x, y, z: 2 * height - z };
    }
    case 'turn':
      return step.onto === 'edge' ? { x, y: z, z: left.widthMm - y } : { x: z, y, z: left.lengthMm - x };
    case 'slice': {
      const k = Math.floor(x / (step.sliceMm + allowances.kerfMm));
      const inSlice = x - k * (step.sliceMm + allowances.kerfMm);
      if (k >= step.count || inSlice > step.sliceMm) return null;
      const isOver = step.turnAlternate && k % 2 === 1;
      return {
        x: k * left.thicknessMm + (isOver ? left.thicknessMm - z : z),
        y: isOver ? left.widthMm - y : y,
        z: inSlice,
      };
    }
    case 'grind': {
      const sides = step.faces === 'all' ? step.perFaceMm : 0;
      return kept({ x: x - sides, y: y - sides, z: z - step.perFaceMm }, after);
    }
    case 'trim':
      return kept({ x: x - step.perEndMm, y, z }, after);
    default:
      throw new RangeError(`movedByStep: "${step.kind}" bends`);
  }
}

function kept(point: Point, size: Size): Point | null {
  return isIn(point, size) ? point : null;
}

function isIn({ x, y, z }: Point, { lengthMm, widthMm, thicknessMm }: Size): boolean {
  return x >= 0 && x <= lengthMm && y >= 0 && y <= widthMm && z >= 0 && z <= thicknessMm;
}

function sizeOf(forging: Forging, barId: string): Size {
  const forged = forging.bars.find(({ id }) => id === barId) as ForgedBar;
  return (forged.states[forged.states.length - 1] as ForgedBar['states'][number]).bar;
}

function startSizeOf(forging: Forging, barId: string): Size {
  const forged = forging.bars.find(({ id }) => id === barId) as ForgedBar;
  return (forged.states[0] as ForgedBar['states'][number]).bar;
}

/** The bars of a design that start as a stack, lowest layer first with their heights. */
export function stacksOf(
  design: Design,
): readonly { readonly bar: string; readonly tops: readonly number[] }[] {
  return design.bars.flatMap((bar) => {
    if (bar.start.kind !== 'stack') return [];
    let height = 0;
    return [{ bar: bar.id, tops: bar.start.layers.map((layer) => (height += layer.thicknessMm)) }];
  });
}
