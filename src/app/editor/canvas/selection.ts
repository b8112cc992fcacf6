import { placesAfterMove } from './landing';

/** Layers chosen, and from where a range goes on. */
export interface Selection {
  readonly places: ReadonlySet<number>;
  /** Where a range begins; null before the first choice. */
  readonly anchor: number | null;
  /** The layer that was chosen last: where the keys go on. */
  readonly cursor: number | null;
}

export const NOTHING_SELECTED: Selection = { places: new Set(), anchor: null, cursor: null };

/** One layer alone. */
export function only(place: number): Selection {
  return { places: new Set([place]), anchor: place, cursor: place };
}

/** One layer more, or one less. */
export function toggled(selection: Selection, place: number): Selection {
  const places = new Set(selection.places);
  if (!places.delete(place)) places.add(place);
  return { places, anchor: place, cursor: place };
}

/** Everything from the anchor to a layer. */
export function rangeTo(selection: Selection, place: number): Selection {
  const anchor = selection.anchor ?? place;
  const places = new Set<number>();
  for (let p = Math.min(anchor, place); p <= Math.max(anchor, place); p++) places.add(p);
  return { places, anchor, cursor: place };
}

/** All of `count` layers. */
export function everything(count: number, selection: Selection): Selection {
  return { ...selection, places: new Set(Array.from({ length: count }, (_, place) => place)) };
}

/** A choice made elsewhere, with anchor and cursor kept where they still fit. */
export function adopted(places: ReadonlySet<number>, before: Selection): Selection {
  const keeps = (place: number | null): boolean => place !== null && places.has(place);
  if (places.size === 0) return { places, anchor: null, cursor: null };
  const top = Math.max(...places);
  return {
    places,
    anchor: keeps(before.anchor) ? before.anchor : top,
    cursor: keeps(before.cursor) ? before.cursor : top,
  };
}

/** The choice after the chosen layers were put before `to`. */
export function movedAlong(selection: Selection, to: number): Selection {
  const old = [...selection.places].sort((a, b) => a - b);
  const now = [...placesAfterMove(selection.places, to)];
  const follow = (place: number | null): number | null =>
    place === null ? null : (now[old.indexOf(place)] ?? now[0] ?? null);
  return { places: new Set(now), anchor: follow(selection.anchor), cursor: follow(selection.cursor) };
}

/** Whether two sets hold the same places. */
export function isSameChoice(a: ReadonlySet<number>, b: ReadonlySet<number>): boolean {
  return a === b || (a.size === b.size && [...a].every((place) => b.has(place)));
}
