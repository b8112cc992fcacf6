import {
  type BarState,
  MAX_SECTION_LAYERS,
  MIN_EXTENT_MM,
  NO_LOSSES,
  NO_REMOVAL,
  type Section,
  cutBar,
  isCutShort,
  joinSections,
  layerCount,
  mirrorSection,
  solidAcross,
} from '../../bar/index.js';
import { type Allowances, type ForgeResult, refuse, refuseCut } from '../step-kind.js';
import type { Restack } from './fields.js';

/**
 * Cuts a bar across into equal lengths and stacks them: L = (L - (n-1)·kerf)/n, T = n·(T - 2g).
 * Layers multiply only while they lie across the thickness; lying across the length, each piece holds others.
 */
export function restackBar(start: BarState, step: Restack, allowances: Allowances): ForgeResult {
  const bar = solidAcross(start, 'thickness');
  const { pieces } = step;
  const kerfsMm = (pieces - 1) * allowances.kerfMm;
  const pieceMm = (bar.lengthMm - kerfsMm) / pieces;
  if (!(pieceMm > MIN_EXTENT_MM)) return refuse('too-short', 'pieces', kerfsMm, bar.lengthMm);
  const grindMm = step.grindPerFaceMm ?? allowances.seamGrindMm;
  const piece = cutBar({ ...bar, lengthMm: pieceMm }, { ...NO_REMOVAL, bottom: grindMm, top: grindMm });
  if (isCutShort(piece)) return refuseCut(piece, 'grindPerFaceMm');
  const laidCrosswise = bar.lie === 'thickness';
  const section = stackedSection(piece.bar, pieces, step.turnAlternate);
  if (section === 'too-many') {
    const asked = pieces * layerCount(piece.bar.section as Section);
    return refuse('too-many-layers', 'pieces', asked, MAX_SECTION_LAYERS, 'layers');
  }
  return {
    bar: {
      ...piece.bar,
      thicknessMm: pieces * piece.bar.thicknessMm,
      layers: laidCrosswise ? bar.layers * pieces : bar.layers,
      section,
      openSeams: bar.openSeams + pieces - 1,
    },
    lossesMm3: {
      ...NO_LOSSES,
      kerf: kerfsMm * bar.widthMm * bar.thicknessMm,
      grinding: pieces * piece.removedMm3,
    },
    eatenLayers: { scale: 0, grinding: pieces * piece.eatenLayers },
  };
}

function stackedSection(
  piece: BarState,
  pieces: number,
  turnAlternate: boolean,
): Section | null | 'too-many' {
  if (piece.section === null || piece.lie === 'mixed' || piece.lie === 'length') return null;
  if (piece.lie === 'width') return piece.section;
  if (layerCount(piece.section) * pieces > MAX_SECTION_LAYERS) return 'too-many';
  const turned = turnAlternate ? mirrorSection(piece.section) : piece.section;
  return joinSections(
    Array.from({ length: pieces }, (_, k) => (k % 2 === 1 ? turned : piece.section) as Section),
  );
}
