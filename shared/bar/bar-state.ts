import { cutSection, mirrorSection, scaleSection, type Section } from './section.js';

/** The axis across which a bar's layers lie, or `mixed` once they were twisted or joined at odds. */
export type Lie = 'thickness' | 'width' | 'length' | 'mixed';

/** The axes of a bar: x along the length, y across the width, z through the thickness. */
export type Axis = Exclude<Lie, 'mixed'>;

/** What a bar is at one moment: a rectangular block and the layers in it. */
export interface BarState {
  /** > 0, along x from the near end. */
  readonly lengthMm: number;
  /** > 0, along y from the left side. */
  readonly widthMm: number;
  /** > 0, along z from the bottom. */
  readonly thicknessMm: number;
  /** Mean by volume fraction, fixed when the bar was put together. */
  readonly densityKgM3: number;
  /** Layers laid, whether or not they are still there. */
  readonly layers: number;
  readonly lie: Lie;
  /** The layers across `lie`; null where no single walk shows them all. */
  readonly section: Section | null;
  /** Seams put together (stack, restack, fold, slices, assembly) that no weld has set yet. */
  readonly openSeams: number;
}

/** Volume of a bar, mm³. */
export function volumeMm3(bar: Pick<BarState, 'lengthMm' | 'widthMm' | 'thicknessMm'>): number {
  return bar.lengthMm * bar.widthMm * bar.thicknessMm;
}

/** Mass in kg of `volume` mm³ at `densityKgM3`. */
export function massKg(volume: number, densityKgM3: number): number {
  return volume * densityKgM3 * 1e-9;
}

/** Extent of the bar along an axis, mm. */
export function extentMm(bar: BarState, axis: Axis): number {
  return axis === 'length' ? bar.lengthMm : axis === 'width' ? bar.widthMm : bar.thicknessMm;
}

/** A bar whose section is a single layer may be said to lie across any axis. */
export function isSolid(bar: BarState): boolean {
  return bar.section?.steels.length === 1;
}

/** The bar's section re-read across `axis`, or null when its layers don't lie that way. */
export function sectionAcross(bar: BarState, axis: Axis): Section | null {
  if (bar.section === null) return null;
  if (bar.lie === axis) return bar.section;
  return isSolid(bar) ? scaleSection(bar.section, extentMm(bar, axis) / bar.section.totalMm) : null;
}

/** The bar with its single layer said to lie across `axis`; any other bar is given back as it is. */
export function solidAcross(bar: BarState, axis: Axis): BarState {
  return isSolid(bar) && bar.lie !== axis ? { ...bar, lie: axis, section: sectionAcross(bar, axis) } : bar;
}

/** The same bar pressed to a new size: layers follow the axis they lie across. */
export function resized(bar: BarState, lengthMm: number, widthMm: number, thicknessMm: number): BarState {
  const next = { ...bar, lengthMm, widthMm, thicknessMm };
  if (bar.section === null || bar.lie === 'mixed') return next;
  const ratio = extentMm(next, bar.lie) / extentMm(bar, bar.lie);
  return ratio === 1 ? next : { ...next, section: scaleSection(bar.section, ratio) };
}

/** How much is taken off each end of each axis, mm, all ≥ 0. */
export interface Removal {
  readonly near: number;
  readonly far: number;
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly top: number;
}

export const NO_REMOVAL: Removal = { near: 0, far: 0, left: 0, right: 0, bottom: 0, top: 0 };

/** The same amount off all six faces. */
export function fromEveryFace(mm: number): Removal {
  return { near: mm, far: mm, left: mm, right: mm, bottom: mm, top: mm };
}

/** A bar after material was taken off, with the volume and the whole layers that went. */
export interface Cut {
  readonly bar: BarState;
  readonly removedMm3: number;
  readonly eatenLayers: number;
}

/** What stopped a cut: the axis, the mm asked for and the mm that are there. */
export interface CutShort {
  readonly axis: Axis;
  readonly askedMm: number;
  readonly availableMm: number;
}

/** Takes material off the faces of a bar. Gives {@link CutShort} when nothing would be left along an axis. */
export function cutBar(bar: BarState, removal: Removal): Cut | CutShort {
  const lengthMm = bar.lengthMm - removal.near - removal.far;
  const widthMm = bar.widthMm - removal.left - removal.right;
  const thicknessMm = bar.thicknessMm - removal.bottom - removal.top;
  if (!(lengthMm > MIN_EXTENT_MM)) return cutShort('length', removal.near + removal.far, bar.lengthMm);
  if (!(widthMm > MIN_EXTENT_MM)) return cutShort('width', removal.left + removal.right, bar.widthMm);
  if (!(thicknessMm > MIN_EXTENT_MM))
    return cutShort('thickness', removal.bottom + removal.top, bar.thicknessMm);
  let section = bar.section;
  let eatenLayers = 0;
  if (section !== null && bar.lie !== 'mixed') {
    const [start, end] = removedAcross(removal, bar.lie);
    const cut = cutSection(section, start, end);
    if (cut.section === null) return cutShort(bar.lie, start + end, section.totalMm);
    section = cut.section;
    eatenLayers = cut.eaten;
  }
  const next = { ...bar, lengthMm, widthMm, thicknessMm, section };
  return { bar: next, removedMm3: volumeMm3(bar) - volumeMm3(next), eatenLayers };
}

/** True for the failing answer of {@link cutBar}. */
export function isCutShort(cut: Cut | CutShort): cut is CutShort {
  return 'askedMm' in cut;
}

/** Less than this along an axis is no bar; steps that would leave less are refused. */
export const MIN_EXTENT_MM = 0.01;

/**
 * The bar after a quarter turn about its length, the top going to the right: new y = old z, new z = W - y.
 * The near and far ends stay where they are.
 */
export function quarterTurned(bar: BarState): BarState {
  const turned = { ...bar, widthMm: bar.thicknessMm, thicknessMm: bar.widthMm };
  if (bar.lie === 'thickness') return { ...turned, lie: 'width' };
  if (bar.lie === 'width') {
    return { ...turned, lie: 'thickness', section: bar.section && mirrorSection(bar.section) };
  }
  return turned;
}

/** The bar after half a turn about its thickness axis: x = L - x, y = W - y. */
export function turnedEndForEnd(bar: BarState): BarState {
  if (bar.section === null || bar.lie === 'thickness' || bar.lie === 'mixed') return bar;
  return { ...bar, section: mirrorSection(bar.section) };
}

/** The bar stood up: the near end goes to the top, new x = old z, new z = L - x. */
export function stoodOnEnd(bar: BarState): BarState {
  const turned = { ...bar, lengthMm: bar.thicknessMm, thicknessMm: bar.lengthMm };
  if (bar.lie === 'thickness') return { ...turned, lie: 'length' };
  if (bar.lie === 'length') {
    return { ...turned, lie: 'thickness', section: bar.section && mirrorSection(bar.section) };
  }
  return turned;
}

function removedAcross(removal: Removal, axis: Axis): [number, number] {
  if (axis === 'thickness') return [removal.bottom, removal.top];
  return axis === 'width' ? [removal.left, removal.right] : [removal.near, removal.far];
}

function cutShort(axis: Axis, askedMm: number, availableMm: number): CutShort {
  return { axis, askedMm, availableMm };
}
