import type { Forging } from '../forging/index.js';
import { type Format, formatFor } from '../units/index.js';
import { type Check, WARNING_SEVERITIES, type WarningSeverity, type WarningValues } from './check.js';
import { analysisUnknown } from './rules/analysis-unknown.js';
import { bandsThin } from './rules/bands-thin.js';
import { blankTooLarge } from './rules/blank-too-large.js';
import { chromium } from './rules/chromium.js';
import { contrastLow } from './rules/contrast-low.js';
import { forgingHeat } from './rules/forging-heat.js';
import { layersEaten } from './rules/layers-eaten.js';
import { likeLayers } from './rules/like-layers.js';
import { longerThanForge } from './rules/longer-than-forge.js';
import { metalUnweldable } from './rules/metal-unweldable.js';
import { nickelSeam } from './rules/nickel-seam.js';
import { cornerNotSquare, twistNotSquare } from './rules/not-square.js';
import { piecesDiffer } from './rules/pieces-differ.js';
import { reductionTooLarge } from './rules/reduction-too-large.js';
import { seamsOpen } from './rules/seams-open.js';
import { tallerThanPress } from './rules/taller-than-press.js';
import { twistShear } from './rules/twist-shear.js';
import { weldHeat } from './rules/weld-heat.js';
import { weldingRange } from './rules/welding-range.js';

/** Every rule. Add one here and nowhere else; within a severity and a place, warnings come in this order. */
export const CHECKS: readonly Check[] = [
  metalUnweldable,
  weldingRange,
  weldHeat,
  chromium,
  nickelSeam,
  analysisUnknown,
  seamsOpen,
  tallerThanPress,
  longerThanForge,
  forgingHeat,
  reductionTooLarge,
  twistNotSquare,
  twistShear,
  cornerNotSquare,
  piecesDiffer,
  layersEaten,
  blankTooLarge,
  likeLayers,
  bandsThin,
  contrastLow,
];

/** A warning as the API gives it and screens and cards show it. */
export interface Warning {
  readonly code: string;
  readonly severity: WarningSeverity;
  /** Id of the bar. */
  readonly bar: string;
  /** Null for what the bar is laid from. */
  readonly stepId: string | null;
  /** What is wrong, with the numbers, and why. */
  readonly message: string;
  readonly values: WarningValues;
  readonly source: string;
  /** What to do about it. */
  readonly remedy: string;
}

/**
 * What a smith should know before lighting the forge, gravest first, then in the order of the document.
 * Worked out anew from the forging each time; nothing is kept.
 * @param format the reader's units; millimetres when absent
 */
export function warningsOf(forging: Forging, format: Format = formatFor('mm')): readonly Warning[] {
  const placeOf = placesOf(forging);
  const placed = CHECKS.flatMap((check) =>
    check.find(forging).map((finding) => ({
      check,
      finding,
      rank: WARNING_SEVERITIES.indexOf(finding.severity),
      place: placeOf(finding.bar, finding.stepId),
    })),
  );
  placed.sort((a, b) => a.rank - b.rank || a.place - b.place);
  return placed.map(({ check, finding: { severity, bar, stepId, values } }) => ({
    code: check.code,
    severity,
    bar,
    stepId,
    ...check.words(values, severity, format),
    values,
    source: check.source,
  }));
}

/** A warning told anew in other units; a code this program doesn't know is left as it is. */
export function retold(warning: Warning, format: Format): Warning {
  const check = CHECKS.find(({ code }) => code === warning.code);
  return check ? { ...warning, ...check.words(warning.values, warning.severity, format) } : warning;
}

/** Order of the places of a design: bars as in the document, each with its start and then its steps. */
function placesOf(forging: Forging): (bar: string, stepId: string | null) => number {
  const places = new Map<string, number>();
  for (const bar of forging.design.bars) {
    places.set(JSON.stringify([bar.id, null]), places.size);
    for (const step of bar.steps) places.set(JSON.stringify([bar.id, step.id]), places.size);
  }
  return (bar, stepId) => places.get(JSON.stringify([bar, stepId])) ?? places.size;
}
