import type { Program } from '../program/program.js';
import type { Surface, SurfaceMap } from './surface.js';

type Vector = readonly [number, number, number];
type Size = Pick<Program, 'lengthMm' | 'widthMm' | 'thicknessMm'>;

/** A plane through a bar: its lower left corner, and how far the picture's two edges reach, mm. */
interface Plane {
  readonly corner: Vector;
  readonly across: Vector;
  readonly up: Vector;
}

/** A face at a depth, or a cut. */
export function flatMap(surface: Exclude<Surface, { kind: 'blade' }>, bar: Size): SurfaceMap {
  const { corner, across, up } = planeOf(surface, bar);
  return {
    widthMm: Math.hypot(...across),
    heightMm: Math.hypot(...up),
    isFlat: true,
    place: (a, b, count, { x, y, z }) => {
      for (let i = 0; i < count; i++) {
        const ai = a[i] as number;
        const bi = b[i] as number;
        x[i] = corner[0] + ai * across[0] + bi * up[0];
        y[i] = corner[1] + ai * across[1] + bi * up[1];
        z[i] = corner[2] + ai * across[2] + bi * up[2];
      }
    },
  };
}

function planeOf(surface: Exclude<Surface, { kind: 'blade' }>, bar: Size): Plane {
  const alongX: Vector = [bar.lengthMm, 0, 0];
  const alongY: Vector = [0, bar.widthMm, 0];
  const alongZ: Vector = [0, 0, bar.thicknessMm];
  if (surface.kind === 'section') {
    return surface.across === 'length'
      ? { corner: [within(surface.atMm, bar.lengthMm), 0, 0], across: alongY, up: alongZ }
      : { corner: [0, within(surface.atMm, bar.widthMm), 0], across: alongX, up: alongZ };
  }
  const { face, depthMm } = surface;
  switch (face) {
    case 'top':
      return {
        corner: [0, 0, within(bar.thicknessMm - depthMm, bar.thicknessMm)],
        across: alongX,
        up: alongY,
      };
    case 'bottom':
      return { corner: [0, 0, within(depthMm, bar.thicknessMm)], across: alongX, up: alongY };
    case 'left':
      return { corner: [0, within(depthMm, bar.widthMm), 0], across: alongX, up: alongZ };
    case 'right':
      return { corner: [0, within(bar.widthMm - depthMm, bar.widthMm), 0], across: alongX, up: alongZ };
    case 'near':
      return { corner: [within(depthMm, bar.lengthMm), 0, 0], across: alongY, up: alongZ };
    case 'far':
      return { corner: [within(bar.lengthMm - depthMm, bar.lengthMm), 0, 0], across: alongY, up: alongZ };
  }
}

function within(value: number, size: number): number {
  return Math.max(0, Math.min(size, value));
}
