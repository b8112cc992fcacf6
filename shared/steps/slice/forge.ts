import {
  type BarState,
  type Lie,
  MAX_SECTION_LAYERS,
  NO_LOSSES,
  type Section,
  isSolid,
  joinSections,
  layerCount,
  mirrorSection,
  scaleSection,
} from '../../bar/index.js';
import { type Allowances, type ForgeResult, refuse } from '../step-kind.js';
import type { Slice } from './fields.js';

/**
 * Cuts slices off the near end and lays them in a row, end grain up: L = count·T, W kept, T = sliceMm (in each
 * slice new x = old z, new z = old x). Each slice costs a kerf; the unused rest counts as trim.
 */
export function sliceBar(bar: BarState, step: Slice, allowances: Allowances): ForgeResult {
  const usedMm = step.count * (step.sliceMm + allowances.kerfMm);
  if (usedMm > bar.lengthMm + 1e-9) return refuse('too-short', 'count', usedMm, bar.lengthMm);
  const areaMm2 = bar.widthMm * bar.thicknessMm;
  if (bar.lie === 'thickness' && bar.section !== null && !isSolid(bar)) {
    const asked = step.count * layerCount(bar.section);
    if (asked > MAX_SECTION_LAYERS)
      return refuse('too-many-layers', 'count', asked, MAX_SECTION_LAYERS, 'layers');
  }
  return {
    bar: {
      ...bar,
      lengthMm: step.count * bar.thicknessMm,
      thicknessMm: step.sliceMm,
      layers: bar.lie === 'thickness' ? bar.layers * step.count : bar.layers,
      ...layersAfter(bar, step),
      openSeams: bar.openSeams + step.count - 1,
    },
    lossesMm3: {
      ...NO_LOSSES,
      kerf: step.count * allowances.kerfMm * areaMm2,
      trim: Math.max(0, bar.lengthMm - usedMm) * areaMm2,
    },
    eatenLayers: { scale: 0, grinding: 0 },
  };
}

function layersAfter(bar: BarState, step: Slice): { lie: Lie; section: Section | null } {
  const { section, lie } = bar;
  switch (lie) {
    case 'thickness': {
      if (section === null) return { lie: 'length', section: null };
      const turned = step.turnAlternate ? mirrorSection(section) : section;
      return {
        lie: 'length',
        section: joinSections(Array.from({ length: step.count }, (_, k) => (k % 2 === 1 ? turned : section))),
      };
    }
    case 'length':
      // Each slice holds other layers, so no single walk shows them all; a solid bar is solid all the same.
      return {
        lie: 'thickness',
        section:
          section !== null && isSolid(bar) ? scaleSection(section, step.sliceMm / section.totalMm) : null,
      };
    default:
      return { lie, section };
  }
}
