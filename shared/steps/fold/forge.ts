import {
  type BarState,
  MAX_SECTION_LAYERS,
  MIN_EXTENT_MM,
  NO_LOSSES,
  NO_REMOVAL,
  cutBar,
  isCutShort,
  joinSections,
  layerCount,
  mirrorSection,
  solidAcross,
} from '../../bar/index.js';
import { type Allowances, type ForgeResult, refuse, refuseCut } from '../step-kind.js';
import type { Fold } from './fields.js';

/** Folds a bar at mid-length, top faces meeting: L = L/2, T = 2·(T - g). Like faces always meet: b bands give 2b - 1. */
export function foldBar(start: BarState, step: Fold, allowances: Allowances): ForgeResult {
  const bar = solidAcross(start, 'thickness');
  if (!(bar.lengthMm / 2 > MIN_EXTENT_MM))
    return refuse('too-short', 'kind', 2 * MIN_EXTENT_MM, bar.lengthMm);
  const grindMm = step.grindPerFaceMm ?? allowances.seamGrindMm;
  const half = cutBar({ ...bar, lengthMm: bar.lengthMm / 2 }, { ...NO_REMOVAL, top: grindMm });
  if (isCutShort(half)) return refuseCut(half, 'grindPerFaceMm');
  const isCrosswise = bar.lie === 'thickness';
  const section = half.bar.section;
  if (isCrosswise && section !== null && 2 * layerCount(section) > MAX_SECTION_LAYERS) {
    return refuse('too-many-layers', 'kind', 2 * layerCount(section), MAX_SECTION_LAYERS, 'layers');
  }
  const folded =
    section === null || bar.lie === 'length'
      ? null
      : isCrosswise
        ? joinSections([section, mirrorSection(section)])
        : section;
  return {
    bar: {
      ...half.bar,
      thicknessMm: 2 * half.bar.thicknessMm,
      layers: isCrosswise ? 2 * bar.layers : bar.layers,
      section: folded,
      openSeams: bar.openSeams + 1,
    },
    lossesMm3: { ...NO_LOSSES, grinding: 2 * half.removedMm3 },
    eatenLayers: { scale: 0, grinding: 2 * half.eatenLayers },
  };
}
