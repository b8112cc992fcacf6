import type { BarState } from '@shared/bar';
import type { Assembly, Piece } from '@shared/design';
import type { Overhang } from '@shared/forging';
import type { Format } from '@shared/units';
import { alongText, overhangTexts } from './bar-text';

const TURN_WORDS = ['', 'a quarter turn', 'turned over', 'three quarter turns'] as const;

/** How a piece is laid in: "a quarter turn, end for end"; empty when it lies as its bar did. */
export function turnText(piece: Piece): string {
  const turn = TURN_WORDS[piece.quarterTurns ?? 0];
  return [...(turn === '' ? [] : [turn]), ...(piece.endForEnd ? ['end for end'] : [])].join(', ');
}

/** A piece of an assembly in words: "Piece 2 of 3, Core, 42 × 5 mm, turned over". */
export function pieceText(
  assembly: Assembly,
  place: number,
  bars: readonly BarState[],
  names: ReadonlyMap<string, string>,
  format: Format,
): string {
  const piece = assembly.pieces[place];
  if (piece === undefined) return '';
  const bar = bars[place];
  const size = bar ? [format.size([bar.widthMm, bar.thicknessMm])] : [];
  const turn = turnText(piece);
  return [
    `Piece ${place + 1} of ${assembly.pieces.length}`,
    names.get(piece.bar) ?? piece.bar,
    ...size,
    ...(turn === '' ? [] : [turn]),
  ].join(', ');
}

/** What the drawing of an assembly shows, in words. */
export function assemblyText(
  assembly: Assembly,
  made: BarState | null,
  bars: readonly BarState[],
  overhangs: readonly Overhang[],
  names: ReadonlyMap<string, string>,
  format: Format,
): string {
  const { along, pieces } = assembly;
  const size = made
    ? `, ${format.length(made.widthMm)} wide, ${format.length(made.thicknessMm)} thick, ${format.length(made.lengthMm)} long`
    : '';
  const from = along === 'thickness' ? 'From the bottom' : 'From the left';
  const named = pieces.map((piece, place) => {
    const bar = bars[place];
    const turn = turnText(piece);
    return [
      names.get(piece.bar) ?? piece.bar,
      ...(bar ? [format.size([bar.widthMm, bar.thicknessMm])] : []),
      ...(turn === '' ? [] : [turn]),
    ].join(', ');
  });
  const trimmed = overhangTexts(overhangs, along, format);
  const trim = trimmed.length === 0 ? '' : ` ${trimmed.join('; ')}: trimmed.`;
  return `End section of ${pieces.length} pieces ${alongText(along)}${size}. ${from}: ${named.join('; ')}.${trim}`;
}
