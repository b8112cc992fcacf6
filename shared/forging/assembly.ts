import {
  type BarState,
  MAX_SECTION_LAYERS,
  MIN_EXTENT_MM,
  NO_LOSSES,
  NO_REMOVAL,
  type Lie,
  type Losses,
  type Section,
  addLosses,
  cutBar,
  isCutShort,
  isSolid,
  joinSections,
  layerCount,
  massKg,
  quarterTurned,
  scaleSection,
  sectionAcross,
  turnedEndForEnd,
  volumeMm3,
} from '../bar/index.js';
import type { Assembly, Piece } from '../design/index.js';
import { type Refusal, refuse } from '../steps/index.js';

/** What sticks out of an assembly and is trimmed, for each piece: mm, all ≥ 0. */
export interface Overhang {
  readonly lengthMm: number;
  /** Across the direction in which the pieces are put together. */
  readonly acrossMm: number;
}

export interface Assembled {
  readonly bar: BarState;
  readonly lossesKg: Losses;
  readonly overhangs: readonly Overhang[];
}

/**
 * One of `count` equal lengths of a bar, sawn with `kerfMm` between them.
 * @returns the piece before it is turned, or a refusal when the kerfs use up the bar
 */
export function pieceOfBar(
  bar: BarState,
  count: number,
  kerfMm: number,
): BarState | { readonly refusal: Refusal } {
  if (count === 1) return bar;
  const kerfsMm = (count - 1) * kerfMm;
  const lengthMm = (bar.lengthMm - kerfsMm) / count;
  if (!(lengthMm > MIN_EXTENT_MM)) return refuse('too-short', 'pieces', kerfsMm, bar.lengthMm);
  if (bar.lie !== 'length' || bar.section === null) return { ...bar, lengthMm };
  const section = isSolid(bar) ? scaleSection(bar.section, lengthMm / bar.lengthMm) : null;
  return { ...bar, lengthMm, section };
}

/** A piece turned as the assembly asks: first its quarter turns, then end for end. */
export function placed(bar: BarState, piece: Piece): BarState {
  let turned = bar;
  for (let i = 0; i < (piece.quarterTurns ?? 0); i++) turned = quarterTurned(turned);
  return piece.endForEnd ? turnedEndForEnd(turned) : turned;
}

/**
 * Puts placed pieces together. Along the thickness T is the sum, W the smallest, L the shortest; along the width the
 * same with W. What sticks out is trimmed at the far end and, across, equally on both sides.
 */
export function assemble(
  pieces: readonly BarState[],
  along: Assembly['along'],
): Assembled | { readonly refusal: Refusal } {
  const across = along === 'thickness' ? 'widthMm' : 'thicknessMm';
  const lengthMm = Math.min(...pieces.map((piece) => piece.lengthMm));
  const acrossMm = Math.min(...pieces.map((piece) => piece[across]));
  const overhangs = pieces.map((piece) => ({
    lengthMm: piece.lengthMm - lengthMm,
    acrossMm: piece[across] - acrossMm,
  }));
  let lossesKg: Losses = NO_LOSSES;
  const trimmed: BarState[] = [];
  for (const [i, piece] of pieces.entries()) {
    const overhang = overhangs[i] as Overhang;
    const side = overhang.acrossMm / 2;
    const cut = cutBar(piece, {
      ...NO_REMOVAL,
      far: overhang.lengthMm,
      ...(along === 'thickness' ? { left: side, right: side } : { bottom: side, top: side }),
    });
    if (isCutShort(cut)) return refuse('nothing-left', 'pieces', cut.askedMm, cut.availableMm);
    trimmed.push(cut.bar);
    lossesKg = addLosses(lossesKg, { ...NO_LOSSES, trim: massKg(cut.removedMm3, piece.densityKgM3) });
  }
  const lain = layersTogether(trimmed, along);
  if ('refusal' in lain) return lain;
  const togetherMm = trimmed.reduce(
    (sum, piece) => sum + (along === 'thickness' ? piece.thicknessMm : piece.widthMm),
    0,
  );
  const volume = trimmed.reduce((sum, piece) => sum + volumeMm3(piece), 0);
  const weighted = trimmed.reduce((sum, piece) => sum + volumeMm3(piece) * piece.densityKgM3, 0);
  return {
    bar: {
      lengthMm,
      widthMm: along === 'thickness' ? acrossMm : togetherMm,
      thicknessMm: along === 'thickness' ? togetherMm : acrossMm,
      densityKgM3: weighted / volume,
      layers: trimmed.reduce((sum, piece) => sum + piece.layers, 0),
      ...lain,
      openSeams: trimmed.reduce((sum, piece) => sum + piece.openSeams, trimmed.length - 1),
    },
    lossesKg,
    overhangs,
  };
}

function layersTogether(
  pieces: readonly BarState[],
  along: Assembly['along'],
): { lie: Lie; section: Section | null } | { readonly refusal: Refusal } {
  const across = pieces.map((piece) => sectionAcross(piece, along));
  if (across.every((section) => section !== null)) {
    const count = across.reduce((sum, section) => sum + layerCount(section), 0);
    if (count > MAX_SECTION_LAYERS)
      return refuse('too-many-layers', 'pieces', count, MAX_SECTION_LAYERS, 'layers');
    return { lie: along, section: joinSections(across) };
  }
  const [first] = pieces as [BarState, ...BarState[]];
  if (first.lie === 'mixed' || pieces.some((piece) => piece.lie !== first.lie))
    return { lie: 'mixed', section: null };
  const isOnePicture = pieces.every((piece) => piece.section === first.section);
  return { lie: first.lie, section: isOnePicture ? first.section : null };
}
