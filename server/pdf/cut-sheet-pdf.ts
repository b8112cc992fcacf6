import { type CutList, cutLineText } from '../../shared/card/index.js';
import type { Format } from '../../shared/units/index.js';
import type { SheetContext } from './forge-card-pdf.js';
import { Sheet } from './sheet.js';

const TICK_PT = 16;

/** The cut list as a PDF: a line to tick for each size of each steel, with the bar length it uses up. */
export function cutSheetPdf(list: CutList, format: Format, context: SheetContext): Promise<Buffer> {
  const sheet = new Sheet(context.paper, `${list.title}: cut sheet`, `${list.title} · ${context.revision}`);
  sheet.paragraph('CUT SHEET', { face: 'sansBold', sizePt: 8, isQuiet: true }, 1);
  sheet.paragraph(list.title, { face: 'sansBold', sizePt: 19 }, 1);
  sheet.paragraph(context.revision, { sizePt: 8.5, isQuiet: true }, 8);
  sheet.rule(1);
  sheet.y += 8;
  for (const line of list.lines) {
    const text = cutLineText(line, format);
    const width = sheet.width - TICK_PT - 10;
    const x = sheet.left + TICK_PT + 10;
    const style = { face: 'sansBold', sizePt: 13 } as const;
    sheet.ensure(sheet.heightOf(text, width, style) + 30);
    sheet.box(sheet.left, sheet.y + 1, TICK_PT, TICK_PT, 1.2);
    sheet.y += sheet.textAt(text, x, sheet.y, width, style) + 1;
    const use = `${format.length(line.barLengthMm)} of bar with a saw cut of ${format.length(list.kerfMm)} for each, ${format.mass(line.massKg)}`;
    sheet.y += sheet.textAt(use, x, sheet.y, width, { sizePt: 10 }) + 10;
  }
  sheet.rule(1);
  sheet.y += 6;
  sheet.paragraph(`All stock: ${format.mass(list.totalMassKg)}`, { face: 'monoBold', sizePt: 12 }, 6);
  sheet.paragraph(
    'Clamp the work, keep the guards on, protect eyes and ears. Nothing galvanised, plated or painted goes into the fire.',
    { sizePt: 8.5 },
  );
  return sheet.finish();
}
