import type { BladeGrind, Blank } from '../../design/index.js';
import type { Program } from '../program/program.js';
import { type Outline, outlineOf } from './outline.js';
import type { SurfaceMap } from './surface.js';

type Size = Pick<Program, 'lengthMm' | 'widthMm' | 'thicknessMm'>;

/** Edge thickness before sharpening where the blank doesn't say. Common practice, no source: 0.3–0.5 mm. */
export const USUAL_EDGE_MM = 0.4;
/** Thickness at the tip, as a part of that at the heel, where the blank doesn't say. Common practice, no source. */
export const USUAL_TIP_SHARE = 0.4;
/** Height of a sabre or hollow grind where the blank doesn't say. Common practice, no source. */
export const USUAL_BEVEL_SHARE = 0.6;
/** Ground off each forged bevel to clean it, mm. Common practice, no source. */
const CLEAN_UP_MM = 0.25;
/** Length over which the plunge runs out, mm: the radius of a grinder's contact wheel edge. Common practice, no source. */
const PLUNGE_RUN_MM = 4;

/** A blade laid into a bar: where each of its points is. */
export interface Blade {
  readonly outline: Outline;
  readonly lengthMm: number;
  readonly widthMm: number;
  /** Where its heel, the side of it that is lowest in y, and its middle plane lie in the bar, mm. */
  readonly nearMm: number;
  readonly leftMm: number;
  readonly middleMm: number;
  readonly isEdgeLeft: boolean;
  /** Half the thickness at the heel's spine, mm. */
  readonly halfMm: number;
  readonly isForged: boolean;
  /**
   * Half the thickness, mm, at a place along the blade and at a height over the edge, 0 at the edge, 1 at the spine.
   */
  readonly halfAt: (alongShare: number, heightShare: number) => number;
}

/** The blade of a blank in a bar; a blank that is not given is as large as the bar. */
export function bladeOf(blank: Blank | undefined, bar: Size): Blade {
  const { lengthMm, widthMm, thicknessMm } = blank ?? bar;
  const middle = (own: number, whole: number): number => (whole - own) / 2;
  const halfMm = thicknessMm / 2;
  const tipHalfMm = (blank?.tipThicknessMm ?? USUAL_TIP_SHARE * thicknessMm) / 2;
  const edgeHalfMm = Math.min(blank?.edgeThicknessMm ?? USUAL_EDGE_MM, thicknessMm) / 2;
  const profile = profileOf(blank?.grind ?? 'flat', blank?.bevelShare ?? USUAL_BEVEL_SHARE);
  const plungeMm = blank?.plungeMm ?? 0;
  return {
    outline: outlineOf(blank ?? {}),
    lengthMm,
    widthMm,
    nearMm: blank?.nearMm ?? middle(lengthMm, bar.lengthMm),
    leftMm: blank?.leftMm ?? middle(widthMm, bar.widthMm),
    middleMm: (blank?.bottomMm ?? middle(thicknessMm, bar.thicknessMm)) + halfMm,
    isEdgeLeft: blank?.edge !== 'right',
    halfMm,
    isForged: blank?.bevels === 'forged',
    halfAt: (alongShare, heightShare) => {
      const spineHalf = halfMm + (tipHalfMm - halfMm) * alongShare;
      const edgeHalf = Math.min(edgeHalfMm, spineHalf);
      const ground = edgeHalf + (spineHalf - edgeHalf) * profile(heightShare);
      const past = plungeMm === 0 ? 1 : smooth((alongShare * lengthMm - plungeMm) / PLUNGE_RUN_MM);
      return spineHalf + (ground - spineHalf) * past;
    },
  };
}

/**
 * How thick a section is over its edge: 0 at the edge, 1 where it is as thick as the spine, for heights from 0 at the
 * edge to 1 at the spine.
 */
function profileOf(grind: BladeGrind, bevelShare: number): (heightShare: number) => number {
  switch (grind) {
    case 'flat':
      return (height) => height;
    case 'sabre':
      return (height) => Math.min(1, height / bevelShare);
    case 'convex':
      // A parabola with its top at the spine.
      return (height) => 1 - (1 - height) * (1 - height);
    case 'hollow':
      // A parabola as near to a wheel's arc as the eye can tell, a third of it straight.
      return (height) => {
        const up = Math.min(1, height / bevelShare);
        return up * (1 + 2 * up) * (1 / 3);
      };
  }
}

/** One side of the blade. */
export function bladeMap(blade: Blade, side: 'left' | 'right', bar: Size): SurfaceMap {
  const { outline, lengthMm, widthMm, isEdgeLeft } = blade;
  // With the edge to the left and the tip away, the blade's left side lies up.
  const sign = (side === 'left') === isEdgeLeft ? 1 : -1;
  const probe = 1e-3;
  return {
    widthMm: lengthMm,
    heightMm: widthMm,
    isFlat: false,
    place: (across, up, count, { x, y, z, isMetal, slope }) => {
      for (let i = 0; i < count; i++) {
        const along = across[i] as number;
        const over = up[i] as number;
        const spine = outline.spineAt(along);
        const edge = outline.edgeAt(along);
        const tall = Math.max(1e-9, edge - spine);
        const height = (over - (1 - edge)) / tall;
        const clamped = Math.max(0, Math.min(1, height));
        const half = blade.halfAt(along, clamped);
        const xi = blade.nearMm + along * lengthMm;
        const yi = blade.leftMm + (isEdgeLeft ? over : 1 - over) * widthMm;
        const zi = blade.middleMm + sign * half * forgedStretch(blade, half);
        const isInside = height >= 0 && height <= 1 && isIn(xi, bar.lengthMm) && isIn(yi, bar.widthMm);
        isMetal[i] = isInside && isIn(zi, bar.thicknessMm) ? 1 : 0;
        x[i] = within(xi, bar.lengthMm);
        y[i] = within(yi, bar.widthMm);
        z[i] = within(zi, bar.thicknessMm);
        const above = blade.halfAt(along, Math.min(1, clamped + probe));
        const below = blade.halfAt(along, Math.max(0, clamped - probe));
        slope[i] = (above - below) / (2 * probe * tall * widthMm);
      }
    },
  };
}

/**
 * How much thicker the bar was, where a forged bevel is now: its layers follow it down to the edge, but for what was
 * ground off to clean it. A ground bevel moves nothing.
 */
export function forgedStretch(blade: Blade, halfMm: number): number {
  return blade.isForged ? (blade.halfMm + CLEAN_UP_MM) / (halfMm + CLEAN_UP_MM) : 1;
}

function smooth(share: number): number {
  const t = Math.max(0, Math.min(1, share));
  return t * t * (3 - 2 * t);
}

function isIn(value: number, size: number): boolean {
  return value >= -1e-9 && value <= size + 1e-9;
}

function within(value: number, size: number): number {
  return Math.max(0, Math.min(size, value));
}
