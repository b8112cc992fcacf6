import type { CardBar, CardStep, CardTarget, ForgeCard } from '../../shared/card/index.js';
import { codeModules } from './code-modules.js';
import { type Paper, Sheet } from './sheet.js';

/** What goes on a sheet beside its content. */
export interface SheetContext {
  readonly paper: Paper;
  /** Address that the code leads to. */
  readonly link: string;
  /** Revision of the design, and the day it was printed, in the reader's form. */
  readonly revision: string;
}

/** Side of the code, 25 mm: read at arm's length from a page lying on the bench. */
const CODE_PT = (25 / 25.4) * 72;
const TICK_PT = 16;
const FIELD_PT = 26;

/** The forge card as a PDF: large figures, a tick box for each step and heat, a field for each real size. */
export function forgeCardPdf(card: ForgeCard, context: SheetContext): Promise<Buffer> {
  const sheet = new Sheet(context.paper, `${card.title}: forge card`, `${card.title} · ${context.revision}`);
  heading(sheet, card, context);
  for (const bar of card.bars) barBlock(sheet, bar, card.bars.length > 1);
  if (card.warnings.length > 0) list(sheet, 'Mind', card.warnings);
  list(sheet, 'Cautions', [...card.cautions.map((caution) => caution.text), card.generalCaution], 8.5);
  return sheet.finish();
}

function heading(sheet: Sheet, card: ForgeCard, context: SheetContext): void {
  const textWidth = sheet.width - CODE_PT - 12;
  const top = sheet.y;
  codeBlock(sheet, context.link, sheet.left + sheet.width - CODE_PT, top);
  let y = top;
  y +=
    sheet.textAt('FORGE CARD', sheet.left, y, textWidth, { face: 'sansBold', sizePt: 8, isQuiet: true }) + 1;
  y += sheet.textAt(card.title, sheet.left, y, textWidth, { face: 'sansBold', sizePt: 19 }) + 1;
  y += sheet.textAt(context.revision, sheet.left, y, textWidth, { sizePt: 8.5, isQuiet: true }) + 4;
  if (card.note) y += sheet.textAt(card.note, sheet.left, y, textWidth, { sizePt: 9.5 }) + 4;
  sheet.y = Math.max(y, top + CODE_PT) + 6;
  factGrid(sheet, card.facts);
}

function codeBlock(sheet: Sheet, link: string, x: number, y: number): void {
  sheet.code(codeModules(link), x, y, CODE_PT);
}

/** Facts in four columns; sizes, which are long, take two. */
function factGrid(sheet: Sheet, facts: ForgeCard['facts']): void {
  const columns = 4;
  const cell = sheet.width / columns;
  sheet.rule(1);
  sheet.y += 4;
  let column = 0;
  let height = 0;
  for (const fact of facts) {
    const span = fact.value.includes('×') || fact.value.length > 14 ? 2 : 1;
    if (column + span > columns) {
      sheet.y += height + 4;
      column = 0;
      height = 0;
    }
    const x = sheet.left + column * cell;
    const width = span * cell - 4;
    const label = sheet.textAt(fact.label, x, sheet.y, width, { sizePt: 8, isQuiet: true });
    const value = sheet.textAt(fact.value, x, sheet.y + label, width, { face: 'monoBold', sizePt: 10.5 });
    height = Math.max(height, label + value);
    column += span;
  }
  sheet.y += height + 4;
  sheet.rule(1);
  sheet.y += 10;
}

function barBlock(sheet: Sheet, bar: CardBar, isNamed: boolean): void {
  sheet.ensure(110);
  if (isNamed) {
    sheet.paragraph(
      bar.isResult ? `${bar.name}: the finished billet` : bar.name,
      { face: 'sansBold', sizePt: 14 },
      2,
    );
  }
  sheet.paragraph(`Put together, bottom or left first: ${bar.startSize}`, { sizePt: 9, isQuiet: true }, 2);
  for (const line of bar.start) sheet.paragraph(line, { sizePt: 11.5 }, 1);
  sheet.y += 7;
  for (const step of bar.steps) stepBlock(sheet, step);
  if (bar.refusal) sheet.paragraph(`Stops here: ${bar.refusal}`, { face: 'sansBold', sizePt: 11 }, 8);
}

function stepBlock(sheet: Sheet, step: CardStep): void {
  const indent = TICK_PT + 8;
  const textWidth = sheet.width - indent;
  const x = sheet.left + indent;
  const title = { face: 'sansBold', sizePt: 13 } as const;
  const notes = [step.note, ...step.warnings].filter(Boolean);
  const noteStyle = { sizePt: 9 } as const;
  const height =
    sheet.heightOf(`${step.number}  ${step.instruction}`, textWidth, title) +
    (step.heat ? 20 : 0) +
    notes.reduce((sum, note) => sum + sheet.heightOf(note, textWidth, noteStyle) + 2, 0) +
    FIELD_PT +
    44;
  sheet.ensure(height);
  sheet.box(sheet.left, sheet.y + 1, TICK_PT, TICK_PT, 1.2);
  sheet.y += sheet.textAt(`${step.number}  ${step.instruction}`, x, sheet.y, textWidth, title) + 3;
  if (step.heat) heatRow(sheet, step.heat, x, textWidth);
  for (const note of notes) sheet.y += sheet.textAt(note, x, sheet.y, textWidth, noteStyle) + 2;
  targetRow(sheet, step.targets, x, textWidth);
  sheet.y += sheet.textAt(
    step.facts.map((fact) => `${fact.label} ${fact.value}`).join('   '),
    x,
    sheet.y,
    textWidth,
    {
      sizePt: 8.5,
      isQuiet: true,
    },
  );
  sheet.y += 11;
}

/** The heats in words, and as many small boxes to tick off (up to twelve). */
function heatRow(sheet: Sheet, heat: string, x: number, width: number): void {
  const style = { sizePt: 10.5 } as const;
  const count = Math.min(12, parseInt(heat, 10) || 0);
  sheet.textAt(heat, x, sheet.y, width, style);
  const from = x + sheet.widthOf(heat, style) + 8;
  for (let i = 0; i < count && from + i * 13 + 9 < x + width; i++)
    sheet.box(from + i * 13, sheet.y + 2, 9, 9, 0.8);
  sheet.y += 17;
}

/** Each size to reach, how near, and a field for the real figure under it. */
function targetRow(sheet: Sheet, targets: readonly CardTarget[], x: number, width: number): void {
  const gap = 6;
  const cell = (width - gap * (targets.length - 1)) / targets.length;
  let height = 0;
  for (const [i, target] of targets.entries()) {
    const left = x + i * (cell + gap);
    let y = sheet.y;
    y += sheet.textAt(target.label, left, y, cell, { sizePt: 8, isQuiet: true });
    y += sheet.textAt(target.value, left, y, cell, { face: 'monoBold', sizePt: 14 });
    y += sheet.textAt(target.tolerance, left, y, cell, { face: 'mono', sizePt: 8, isQuiet: true }) + 2;
    sheet.box(left, y, cell, FIELD_PT, 0.6);
    sheet.textAt('real', left + 3, y + 2, cell, { sizePt: 6.5, isQuiet: true });
    height = Math.max(height, y + FIELD_PT - sheet.y);
  }
  sheet.y += height + 3;
}

function list(sheet: Sheet, title: string, lines: readonly string[], sizePt = 9.5): void {
  sheet.ensure(60);
  sheet.y += 4;
  sheet.rule();
  sheet.y += 5;
  sheet.paragraph(title, { face: 'sansBold', sizePt: 11 }, 2);
  for (const line of lines) sheet.paragraph(line, { sizePt }, 4);
}
