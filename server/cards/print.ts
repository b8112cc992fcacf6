import { cutList, forgeCard } from '../../shared/card/index.js';
import { refusalWords, warningsOf } from '../../shared/checks/index.js';
import type { Design } from '../../shared/design/index.js';
import { type StepRefusal, evaluate } from '../../shared/forging/index.js';
import { type UnitSystem, formatFor } from '../../shared/units/index.js';
import { cutSheetPdf } from '../pdf/cut-sheet-pdf.js';
import { type SheetContext, forgeCardPdf } from '../pdf/forge-card-pdf.js';

/** All that a sheet is made from; plain data, so that it can be made on another thread. */
export interface SheetOrder {
  readonly design: Design;
  readonly units: UnitSystem;
  readonly context: SheetContext;
}

/** The forge card of a design as a PDF. */
export function printForgeCard({ design, units, context }: SheetOrder): Promise<Uint8Array> {
  const forging = evaluate(design);
  const format = formatFor(units);
  const card = forgeCard(forging, {
    format,
    warnings: warningsOf(forging, format),
    refusalWords: (bar) => refusalWords(bar.refusal as StepRefusal, design, format),
  });
  return forgeCardPdf(card, context);
}

/** The cut list of a design as a PDF. */
export function printCutSheet({ design, units, context }: SheetOrder): Promise<Uint8Array> {
  return cutSheetPdf(cutList(evaluate(design)), formatFor(units), context);
}
