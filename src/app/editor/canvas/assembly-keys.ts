import type { Piece } from '@shared/design';
import { quarterTurns } from './assembly-geometry';
import { placeAfterMove } from './assembly-tool';
import type { AssemblyGesture } from './contract';
import type { KeyPress } from './stack-keys';

/** What a key asks for. A gesture is whole: it starts, edits once and settles. */
export type AssemblyKeyOutput =
  | { readonly kind: 'select'; readonly selection: number | null }
  | { readonly kind: 'gesture'; readonly gesture: AssemblyGesture; readonly selection: number | null };

/**
 * What a key does on an assembly: arrows go from piece to piece, with Alt they move the chosen one; R turns it by a
 * quarter, with Shift the other way; E turns it end for end. Null: the key is not ours.
 */
export function assemblyKey(
  press: KeyPress,
  pieces: readonly Piece[],
  chosen: number | null,
): AssemblyKeyOutput | null {
  if (press.command) return null;
  const by = direction(press.key);
  if (by !== null) return press.alt ? moved(by, pieces.length, chosen) : went(by, pieces.length, chosen);
  if (press.alt) return null;
  switch (press.key) {
    case 'Home':
      return { kind: 'select', selection: 0 };
    case 'End':
      return { kind: 'select', selection: pieces.length - 1 };
    case 'Escape':
      return chosen === null ? null : { kind: 'select', selection: null };
    case 'r':
    case 'R':
      return turned(press.shift ? -1 : 1, pieces, chosen);
    case 'e':
    case 'E':
      return endForEnd(pieces, chosen);
    default:
      return null;
  }
}

/** A whole gesture that turns the chosen piece by quarters, or null when none is chosen. */
export function turned(
  by: number,
  pieces: readonly Piece[],
  chosen: number | null,
): AssemblyKeyOutput | null {
  const piece = chosen === null ? undefined : pieces[chosen];
  if (chosen === null || piece === undefined) return null;
  const turns = quarterTurns((piece.quarterTurns ?? 0) + by);
  return {
    kind: 'gesture',
    gesture: { kind: 'turn', place: chosen, quarterTurns: turns },
    selection: chosen,
  };
}

/** A whole gesture that turns the chosen piece end for end, or null when none is chosen. */
export function endForEnd(pieces: readonly Piece[], chosen: number | null): AssemblyKeyOutput | null {
  const piece = chosen === null ? undefined : pieces[chosen];
  if (chosen === null || piece === undefined) return null;
  const gesture = { kind: 'end-for-end', place: chosen, endForEnd: piece.endForEnd !== true } as const;
  return { kind: 'gesture', gesture, selection: chosen };
}

/** Up and to the right is onward: so the places count. */
function direction(key: string): 1 | -1 | null {
  if (key === 'ArrowUp' || key === 'ArrowRight') return 1;
  return key === 'ArrowDown' || key === 'ArrowLeft' ? -1 : null;
}

function went(by: 1 | -1, count: number, chosen: number | null): AssemblyKeyOutput {
  const from = chosen ?? (by === 1 ? -1 : count);
  return { kind: 'select', selection: Math.min(count - 1, Math.max(0, from + by)) };
}

function moved(by: 1 | -1, count: number, chosen: number | null): AssemblyKeyOutput | null {
  if (chosen === null || chosen + by < 0 || chosen + by >= count) return null;
  const to = by === 1 ? chosen + 2 : chosen - 1;
  return {
    kind: 'gesture',
    gesture: { kind: 'move', place: chosen, to },
    selection: placeAfterMove(chosen, to),
  };
}
