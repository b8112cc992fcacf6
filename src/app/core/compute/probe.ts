import type { Design } from '@shared/design';
import { type Surface, type Tracer, layerThicknessMm, surfaceMap } from '@shared/pattern';

/** What is at a place of a surface. */
export interface Probe {
  /** Place in the bar, mm: from the near end, the left side and the bottom. */
  readonly xMm: number;
  readonly yMm: number;
  readonly zMm: number;
  readonly steel: string;
  /** The bar in whose stack the layer was laid, and its place there, the bottom one 0. */
  readonly bar: string;
  readonly place: number;
  readonly layersInStack: number;
  /** Of the band there, square to it: neighbouring layers of one steel are one band. Null where it can't be told. */
  readonly bandMm: number | null;
  /** How wide the band shows on the surface, across its run. Null where it runs level with the surface. */
  readonly showsMm: number | null;
}

type Vector = readonly [x: number, y: number, z: number];

/** How far beside the place the tracer is asked how the layers lie, mm: little against any band that can be seen. */
const BESIDE_MM = 2e-5;
/** Layers of one steel that are looked through to find where a band ends. */
const MOST_JOINED = 12;
/** A band seen so flatly that it would show wider than this, mm, is level with the surface. */
const LEVEL_MM = 2_000;

/**
 * What lies under a place of a surface; null where there is no metal.
 * @param tracer in double precision
 * @param across 0–1 from the left edge of the surface
 * @param up 0–1 from its lower edge
 */
export function probeAt(
  tracer: Tracer,
  surface: Surface,
  blank: Design['blank'],
  across: number,
  up: number,
): Probe | null {
  const at = placeOf(tracer, surface, blank, across, up);
  if (at === null) return null;
  const { program } = tracer;
  const { layer, z } = traced(tracer, at);
  const place = program.layerPlace[layer] as number;
  const bar = program.layerBar[layer] as number;
  const slope = slopeAt(tracer, at, layer, z);
  const bandMm = slope && bandAt(tracer, at, layer, z, slope);
  // A forged bevel is thinner than the bar was, where its points are looked up.
  const isSqueezed = surface.kind === 'blade' && blank?.bevels === 'forged';
  return {
    xMm: at[0],
    yMm: at[1],
    zMm: at[2],
    steel: program.steelIds[program.layerSteel[layer] as number] as string,
    bar: program.barIds[bar] as string,
    place,
    layersInStack: layersOf(program.layerPlace, layer - place),
    bandMm: isSqueezed ? null : bandMm,
    showsMm: bandMm && shownMm(tracer, surface, blank, [across, up], bandMm, slope),
  };
}

function placeOf(
  { program }: Tracer,
  surface: Surface,
  blank: Design['blank'],
  across: number,
  up: number,
): Vector | null {
  const points = {
    x: new Float64Array(1),
    y: new Float64Array(1),
    z: new Float64Array(1),
    // Flat surfaces are metal throughout, and don't say so.
    isMetal: Uint8Array.of(1),
    slope: new Float32Array(1),
  };
  surfaceMap(surface, program, blank).place(Float64Array.of(across), Float64Array.of(up), 1, points);
  return points.isMetal[0] === 1
    ? [points.x[0] as number, points.y[0] as number, points.z[0] as number]
    : null;
}

/** The layer at a place of the bar, and the height there in its stack, mm. */
function traced(tracer: Tracer, [x, y, z]: Vector): { readonly layer: number; readonly z: number } {
  tracer.x[0] = x;
  tracer.y[0] = y;
  tracer.z[0] = z;
  tracer.run(1);
  return { layer: tracer.layer[0] as number, z: tracer.z[0] };
}

/** How the height in the stack grows in the bar: its gradient. Null where every neighbour is of another layer. */
function slopeAt(tracer: Tracer, at: Vector, layer: number, z: number): Vector | null {
  const along = (axis: 0 | 1 | 2): number | null => {
    for (const sign of [1, -1]) {
      const moved: [number, number, number] = [...at];
      moved[axis] += sign * BESIDE_MM;
      const there = traced(tracer, moved);
      if (there.layer === layer) return (there.z - z) / (sign * BESIDE_MM);
    }
    return null;
  };
  const x = along(0);
  const y = along(1);
  const z0 = along(2);
  return x === null || y === null || z0 === null ? null : [x, y, z0];
}

/** Thickness of the band, mm: from the place to where the steel changes, either way, square to the layers. */
function bandAt(tracer: Tracer, at: Vector, layer: number, z: number, slope: Vector): number | null {
  const steepness = Math.hypot(...slope);
  if (!(steepness > 0)) return null;
  const unit: Vector = [slope[0] / steepness, slope[1] / steepness, slope[2] / steepness];
  const up = reachMm(tracer, at, layer, z, unit, steepness, 1);
  const down = reachMm(tracer, at, layer, z, unit, steepness, -1);
  return up + down;
}

function reachMm(
  tracer: Tracer,
  from: Vector,
  layer: number,
  z: number,
  unit: Vector,
  steepness: number,
  sign: 1 | -1,
): number {
  const { program } = tracer;
  const steel = program.layerSteel[layer];
  const beyondMm = BESIDE_MM / 4;
  let reach = 0;
  let now = { layer, z, steepness, sign };
  for (let joined = 0; joined < MOST_JOINED; joined++) {
    const topMm = program.layerTopMm[now.layer] as number;
    const bottomMm = topMm - layerThicknessMm(program, now.layer);
    const leftMm = (now.sign > 0 ? topMm - now.z : now.z - bottomMm) / now.steepness;
    const at = moved(from, unit, sign * (reach + leftMm + beyondMm));
    if (isOutside(program, at)) return Math.min(reach + leftMm, toSkinMm(program, from, unit, sign));
    reach += leftMm;
    const next = traced(tracer, at);
    if (program.layerSteel[next.layer] !== steel) return reach;
    reach += beyondMm;
    const slope = slopeAt(tracer, at, next.layer, next.z);
    if (slope === null) return reach;
    const along = slope[0] * unit[0] + slope[1] * unit[1] + slope[2] * unit[2];
    if (Math.abs(along) < 1e-9) return reach;
    // Past a fold or a turned piece the heights run the other way.
    now = { ...next, steepness: Math.abs(along), sign: along * sign > 0 ? 1 : -1 };
  }
  return reach;
}

function moved(from: Vector, unit: Vector, byMm: number): Vector {
  return [from[0] + unit[0] * byMm, from[1] + unit[1] * byMm, from[2] + unit[2] * byMm];
}

type Size = Tracer['program'];

function isOutside({ lengthMm, widthMm, thicknessMm }: Size, [x, y, z]: Vector): boolean {
  return x < 0 || y < 0 || z < 0 || x > lengthMm || y > widthMm || z > thicknessMm;
}

/** How far the skin of the bar is in a direction, mm. */
function toSkinMm(bar: Size, from: Vector, unit: Vector, sign: 1 | -1): number {
  const sizes: Vector = [bar.lengthMm, bar.widthMm, bar.thicknessMm];
  return Math.min(
    ...([0, 1, 2] as const).map((axis) => {
      const step = sign * unit[axis];
      if (step === 0) return Infinity;
      return (step > 0 ? sizes[axis] - from[axis] : -from[axis]) / step;
    }),
  );
}

/** Width at which a band of a thickness shows on a surface that cuts it at a slant. */
function shownMm(
  tracer: Tracer,
  surface: Surface,
  blank: Design['blank'],
  [across, up]: readonly [number, number],
  bandMm: number,
  slope: Vector,
): number | null {
  const map = surfaceMap(surface, tracer.program, blank);
  const beside = 1e-4;
  const here = placeOf(tracer, surface, blank, across, up);
  const right = placeOf(tracer, surface, blank, across + (across < 0.5 ? beside : -beside), up);
  const above = placeOf(tracer, surface, blank, across, up + (up < 0.5 ? beside : -beside));
  if (!here || !right || !above) return null;
  const change = (there: Vector): number =>
    slope.reduce((sum, part, axis) => sum + part * ((there[axis] as number) - (here[axis] as number)), 0);
  const onSurface = Math.hypot(
    change(right) / (beside * map.widthMm),
    change(above) / (beside * map.heightMm),
  );
  const width = (bandMm * Math.hypot(...slope)) / onSurface;
  return width < LEVEL_MM ? width : null;
}

function layersOf(layerPlace: Uint16Array, bottom: number): number {
  let count = 1;
  while (bottom + count < layerPlace.length && (layerPlace[bottom + count] as number) > 0) count += 1;
  return count;
}
