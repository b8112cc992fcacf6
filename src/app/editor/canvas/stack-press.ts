import type { UnitSystem } from '@shared/units';
import { NOTHING_SELECTED, type Selection, only, rangeTo, toggled } from './selection';
import { type StackGeometry, type StackHit, layerAt } from './stack-geometry';
import type { Modifiers, PointerDevice } from './tool';
import { type AreaPx, type PointPx, type Viewport, toMm } from './viewport';

/** The drawing as it is now: what the tool acts on, and never changes. */
export interface StackSheet {
  readonly geometry: StackGeometry;
  readonly viewport: Viewport;
  /** Where the stack may be drawn. */
  readonly area: AreaPx;
  readonly selection: Selection;
  readonly stockMm: readonly number[];
  readonly system: UnitSystem;
  /** The layer whose name or figure is written at a point beside the stack, or null. */
  readonly labelAt: (at: PointPx) => number | null;
}

/** A pointer that went down. */
export interface Press {
  readonly pointer: number;
  readonly device: PointerDevice;
  readonly at: PointPx;
  readonly hit: StackHit;
  readonly modifiers: Modifiers;
  /** Whether what it hit was chosen before. */
  readonly wasChosen: boolean;
}

/** What is chosen as soon as a pointer goes down. What is chosen already waits: it may be a drag of them all. */
export function chosenOnPress(press: Press, selection: Selection): Selection | null {
  const { hit, modifiers } = press;
  if (hit.kind !== 'layer') return null;
  if (modifiers.extends) return rangeTo(selection, hit.place);
  if (press.wasChosen) return null;
  return modifiers.toggles ? toggled(selection, hit.place) : only(hit.place);
}

/** What a click chooses when it turned out to be no drag; null: what is chosen stays. */
export function chosenOnClick(press: Press, sheet: StackSheet): Selection | null {
  const { hit, modifiers, device } = press;
  const { selection } = sheet;
  if (hit.kind === 'empty') {
    const isCleared = selection.places.size > 0 && !modifiers.extends && !modifiers.toggles;
    return isCleared ? NOTHING_SELECTED : null;
  }
  if (hit.kind === 'grip') return null;
  // An edge is for drawing; clicked, it means the layer that is really there.
  const there =
    hit.kind === 'edge' ? layerAt(sheet.geometry, toMm(sheet.viewport, press.at).upMm) : hit.place;
  const place = there ?? hit.place;
  const waitsForClick = hit.kind === 'edge' || device === 'touch';
  if (waitsForClick && modifiers.extends) return rangeTo(selection, place);
  // A pointer chose on press; only what was chosen already had to wait for the click.
  if (!waitsForClick && (modifiers.extends || !press.wasChosen)) return null;
  if (modifiers.toggles) return toggled(selection, place);
  return selection.places.size === 1 && selection.places.has(place) ? null : only(place);
}
