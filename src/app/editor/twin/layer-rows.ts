import type { Layer } from '@shared/design';
import type { Steel } from '@shared/steels';
import type { Format } from '@shared/units';

/** A layer as a row of the grid: the top of the stack is the first row, as it lies. */
export interface LayerRow {
  /** 0 at the bottom. */
  readonly place: number;
  readonly steel: Steel | undefined;
  readonly name: string;
  readonly thickness: string;
  readonly thicknessMm: number;
}

/** Rows from the top of the stack down. */
export function layerRows(
  layers: readonly Layer[],
  steels: ReadonlyMap<string, Steel>,
  format: Format,
): readonly LayerRow[] {
  return layers
    .map((layer, place): LayerRow => {
      const steel = steels.get(layer.steel);
      return {
        place,
        steel,
        name: steel?.name ?? layer.steel,
        thickness: format.length(layer.thicknessMm),
        thicknessMm: layer.thicknessMm,
      };
    })
    .reverse();
}

/** "Layer 13 of 13, top": the place of a layer in words. */
export function placeWords(place: number, count: number): string {
  const end = place === count - 1 ? ', top' : place === 0 ? ', bottom' : '';
  return `Layer ${place + 1} of ${count}${end}`;
}

/** Columns of the grid. */
export const COLUMNS = ['place', 'steel', 'thickness'] as const;
export type Column = (typeof COLUMNS)[number];

/** Where the keyboard is in the grid. */
export interface GridPoint {
  /** Row from the top, 0 first. */
  readonly row: number;
  readonly column: Column;
}

/** Rows that Page Up and Page Down go. */
const PAGE = 10;

/** Where a key takes the keyboard to; null for a key that goes nowhere. */
export function pointByKey(
  from: GridPoint,
  rows: number,
  event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey'>,
): GridPoint | null {
  const isWide = event.ctrlKey || event.metaKey;
  const column = COLUMNS.indexOf(from.column);
  const to = (row: number, at: number): GridPoint => ({
    row: Math.min(rows - 1, Math.max(0, row)),
    column: COLUMNS[Math.min(COLUMNS.length - 1, Math.max(0, at))] as Column,
  });
  switch (event.key) {
    case 'ArrowUp':
      return to(isWide ? 0 : from.row - 1, column);
    case 'ArrowDown':
      return to(isWide ? rows - 1 : from.row + 1, column);
    case 'ArrowLeft':
      return to(from.row, column - 1);
    case 'ArrowRight':
      return to(from.row, column + 1);
    case 'Home':
      return to(isWide ? 0 : from.row, 0);
    case 'End':
      return to(isWide ? rows - 1 : from.row, COLUMNS.length - 1);
    case 'PageUp':
      return to(from.row - PAGE, column);
    case 'PageDown':
      return to(from.row + PAGE, column);
    default:
      return null;
  }
}
