import type { Blank } from '@shared/design';
import { type Face, type Surface, surfaceMap } from '@shared/pattern';
import type { Format } from '@shared/units';

/** Size of a bar, mm. */
export interface BarSize {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
}

/** What can be looked at, in the order in which it is offered. */
export const VIEWS = [
  { id: 'blade-left', group: 'Blade', label: 'Blade, left side' },
  { id: 'blade-right', group: 'Blade', label: 'Blade, right side' },
  { id: 'top', group: 'Faces', label: 'Top face' },
  { id: 'bottom', group: 'Faces', label: 'Bottom face' },
  { id: 'left', group: 'Faces', label: 'Left side' },
  { id: 'right', group: 'Faces', label: 'Right side' },
  { id: 'near', group: 'Faces', label: 'Near end' },
  { id: 'far', group: 'Faces', label: 'Far end' },
  { id: 'cross', group: 'Cuts', label: 'Cross-section' },
  { id: 'lengthwise', group: 'Cuts', label: 'Cut lengthwise' },
] as const;
export type ViewId = (typeof VIEWS)[number]['id'];
export const VIEW_IDS: readonly ViewId[] = VIEWS.map(({ id }) => id);

/** Views under the words of their group. */
export interface ViewGroup {
  readonly label: string;
  readonly views: readonly (typeof VIEWS)[number][];
}

/** @param hasBlade whether the bar is what the blade is ground from */
export function viewGroups(hasBlade: boolean): readonly ViewGroup[] {
  return (hasBlade ? ['Blade', 'Faces', 'Cuts'] : ['Faces', 'Cuts']).map((label) => ({
    label,
    views: VIEWS.filter(({ group }) => group === label),
  }));
}

/** How a reader's choice is kept: depths in mm, places of cuts as shares, so that they mean the same after a draw. */
export interface Choice {
  readonly view: ViewId;
  /** How deep faces are ground, mm. Null: nobody said; a little. */
  readonly depthMm: number | null;
  /** Where the bar is cut, 0–1 along the length or across the width. */
  readonly cutShare: number;
}

export const FIRST_CHOICE: Choice = { view: 'blade-left', depthMm: null, cutShare: 0.5 };

/** Ground off a face to see the pattern while nobody says otherwise. Common practice, no source. */
const USUAL_GRIND_MM = 1;
const USUAL_GRIND_SHARE = 0.15;

/** A slider for where the bar is looked at. */
export interface Place {
  readonly kind: 'depth' | 'cut';
  readonly label: string;
  readonly mm: number;
  readonly maxMm: number;
  readonly stepMm: number;
}

/** A surface as it is shown. */
export interface ShownView {
  readonly id: ViewId;
  readonly label: string;
  readonly surface: Surface;
  /** Null for the blade: its depth is its grind. */
  readonly place: Place | null;
  readonly widthMm: number;
  readonly heightMm: number;
}

/** What a choice comes to on a bar: what it doesn't have gives way to the top face. */
export function shownView(choice: Choice, bar: BarSize, blank: Blank | undefined, format: Format): ShownView {
  const isBlade = choice.view === 'blade-left' || choice.view === 'blade-right';
  const id: ViewId = isBlade && !blank ? 'top' : choice.view;
  const place = placeOf(id, choice, bar, format);
  const surface = surfaceOf(id, place?.mm ?? 0);
  const { widthMm, heightMm } = surfaceMap(surface, bar, blank);
  const { label } = VIEWS.find((view) => view.id === id) as (typeof VIEWS)[number];
  return { id, label, surface, place, widthMm, heightMm };
}

/** A choice with its slider moved. */
export function movedTo(choice: Choice, place: Place, mm: number): Choice {
  return place.kind === 'depth'
    ? { ...choice, depthMm: mm }
    : { ...choice, cutShare: place.maxMm > 0 ? mm / place.maxMm : 0.5 };
}

function surfaceOf(id: ViewId, mm: number): Surface {
  switch (id) {
    case 'blade-left':
      return { kind: 'blade', side: 'left' };
    case 'blade-right':
      return { kind: 'blade', side: 'right' };
    case 'cross':
      return { kind: 'section', across: 'length', atMm: mm };
    case 'lengthwise':
      return { kind: 'section', across: 'width', atMm: mm };
    default:
      return { kind: 'face', face: id, depthMm: mm };
  }
}

function placeOf(id: ViewId, choice: Choice, bar: BarSize, format: Format): Place | null {
  if (id === 'blade-left' || id === 'blade-right') return null;
  if (id === 'cross' || id === 'lengthwise') {
    const maxMm = id === 'cross' ? bar.lengthMm : bar.widthMm;
    return {
      kind: 'cut',
      label: id === 'cross' ? 'Cut, from the near end' : 'Cut, from the left side',
      mm: choice.cutShare * maxMm,
      maxMm,
      stepMm: stepMm(maxMm, format),
    };
  }
  const maxMm = depthOf(id, bar);
  const usualMm = Math.min(USUAL_GRIND_MM, USUAL_GRIND_SHARE * maxMm);
  return {
    kind: 'depth',
    label: 'Ground',
    mm: Math.min(maxMm, choice.depthMm ?? usualMm),
    maxMm,
    stepMm: stepMm(maxMm, format),
  };
}

/** How far a face can be ground: through to the opposite one. */
function depthOf(face: Face, bar: BarSize): number {
  if (face === 'top' || face === 'bottom') return bar.thicknessMm;
  return face === 'left' || face === 'right' ? bar.widthMm : bar.lengthMm;
}

/** A step of the slider: a mark of the reader's rule, finer on what is thin. */
function stepMm(maxMm: number, format: Format): number {
  if (format.system === 'inch') return maxMm > 60 ? 25.4 / 16 : maxMm > 4 ? 25.4 / 64 : 25.4 / 500;
  return maxMm > 60 ? 1 : maxMm > 4 ? 0.1 : 0.02;
}
