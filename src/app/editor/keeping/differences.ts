import { type Bar, type Design, type Stack, barOf, steelOf } from '@shared/design';
import { evaluate } from '@shared/forging';
import { ALLOWANCE_DEFAULTS, type Allowances, kindOf } from '@shared/steps';
import type { Format } from '@shared/units';
import { isSameDocument } from './same-document';

/** Something that is not the same in two versions of a design: where, and what each has. */
export interface Difference {
  readonly where: string;
  readonly mine: string;
  readonly theirs: string;
}

const NOTHING = '—';

/** What differs between two versions of a design, in words and figures; first what comes of them, then the plan. */
export function differencesOf(mine: Design, theirs: Design, format: Format): readonly Difference[] {
  const found: Difference[] = [];
  const compare = (where: string, a: string, b: string): void => {
    if (a !== b) found.push({ where, mine: a, theirs: b });
  };
  compare('Name', mine.name, theirs.name);
  compare('Outcome', outcomeWords(mine, format), outcomeWords(theirs, format));
  compare('Billet', barOf(mine, mine.result).name, barOf(theirs, theirs.result).name);
  compareBars(mine, theirs, format, compare);
  compare('Blank', blankWords(mine, format), blankWords(theirs, format));
  for (const name of Object.keys(ALLOWANCE_DEFAULTS) as (keyof Allowances)[]) {
    const words = (design: Design): string => {
      const value = design.allowances?.[name];
      return value === undefined ? 'as usual' : allowanceWords(name, value, format);
    };
    compare(ALLOWANCE_DEFAULTS[name].label, words(mine), words(theirs));
  }
  const limits = (design: Design): string => JSON.stringify(design.limits ?? {});
  if (!isSameDocument(mine.limits ?? {}, theirs.limits ?? {})) {
    found.push({ where: 'What the machines take', mine: limits(mine), theirs: limits(theirs) });
  }
  compare('Note', mine.note ?? NOTHING, theirs.note ?? NOTHING);
  return found;
}

type Compare = (where: string, mine: string, theirs: string) => void;

function compareBars(mine: Design, theirs: Design, format: Format, compare: Compare): void {
  const ids = new Set([...mine.bars, ...theirs.bars].map((bar) => bar.id));
  for (const id of ids) {
    const a = mine.bars.find((bar) => bar.id === id);
    const b = theirs.bars.find((bar) => bar.id === id);
    const name = (a ?? b)?.name ?? id;
    if (!a || !b) {
      compare(`Bar “${name}”`, a ? 'there' : NOTHING, b ? 'there' : NOTHING);
      continue;
    }
    compare(`Name of “${name}”`, a.name, b.name);
    if (a.start.kind === 'stack' && b.start.kind === 'stack') {
      compare(`Stack of “${name}”`, stackSize(a.start, format), stackSize(b.start, format));
      compare(
        `Layers of “${name}”`,
        layersWords(a.start, mine, format),
        layersWords(b.start, theirs, format),
      );
    } else {
      compare(`Start of “${name}”`, startWords(a, mine, format), startWords(b, theirs, format));
    }
    compareSteps(a, b, name, format, compare);
  }
}

function compareSteps(a: Bar, b: Bar, name: string, format: Format, compare: Compare): void {
  const ids = [...new Set([...a.steps, ...b.steps].map((step) => step.id))];
  for (const id of ids) {
    const words = (bar: Bar): string => stepWords(bar, id, format);
    const place = a.steps.findIndex((step) => step.id === id);
    const number = (place >= 0 ? place : b.steps.findIndex((step) => step.id === id)) + 1;
    compare(`“${name}”, step ${number}`, words(a), words(b));
  }
  // Steps that both have, each with its number in mine, in the order in which each version has them.
  const order = (bar: Bar): string =>
    bar.steps
      .flatMap((step) => {
        const number = a.steps.findIndex(({ id }) => id === step.id) + 1;
        return number > 0 && b.steps.some(({ id }) => id === step.id)
          ? [`${number} ${kindOf(step).words.name}`]
          : [];
      })
      .join(', ');
  compare(`Order of the steps of “${name}”`, order(a), order(b));
}

function stepWords(bar: Bar, id: string, format: Format): string {
  const step = bar.steps.find((candidate) => candidate.id === id);
  if (!step) return NOTHING;
  const heats = step.heats ? `, ${step.heats} ${step.heats === 1 ? 'heat' : 'heats'}` : '';
  const minutes = step.minutesPerHeat === undefined ? '' : `, ${format.duration(step.minutesPerHeat)} each`;
  const heat = step.temperatureC === undefined ? '' : `, ${format.temperature(step.temperatureC)}`;
  const note = step.note ? `, note: ${step.note}` : '';
  const off = step.isOff ? ' (switched off)' : '';
  return kindOf(step).words.instruction(step, format) + heats + minutes + heat + note + off;
}

function stackSize(stack: Stack, format: Format): string {
  const heightMm = stack.layers.reduce((sum, layer) => sum + layer.thicknessMm, 0);
  return `${format.size([stack.lengthMm, stack.widthMm, heightMm])}, ${stack.layers.length} layers`;
}

function startWords(bar: Bar, design: Design, format: Format): string {
  const { start } = bar;
  if (start.kind === 'stack') return `${stackSize(start, format)}: ${layersWords(start, design, format)}`;
  const pieces = start.pieces.map((piece) => {
    const turned = piece.quarterTurns ? `, turned ${piece.quarterTurns}/4` : '';
    const end = piece.endForEnd ? ', end for end' : '';
    return `${barOf(design, piece.bar).name}${turned}${end}`;
  });
  const along = start.along === 'thickness' ? 'on top of each other' : 'side by side';
  return `${pieces.length} pieces ${along}: ${pieces.join('; ')}`;
}

/** Steels with what lies of each: "7 × 1084 (3.2 mm), 6 × 15N20 (1.8 mm)", and the order where counts alone don't tell. */
function layersWords(stack: Stack, design: Design, format: Format): string {
  const kinds = new Map<string, number>();
  for (const { steel, thicknessMm } of stack.layers) {
    const words = `${steelOf(design, steel)?.name ?? steel} (${format.length(thicknessMm)})`;
    kinds.set(words, (kinds.get(words) ?? 0) + 1);
  }
  const counts = [...kinds].map(([words, count]) => `${count} × ${words}`).join(', ');
  const letters = [...kinds.keys()];
  const order = stack.layers
    .map(({ steel, thicknessMm }) =>
      letters.indexOf(`${steelOf(design, steel)?.name ?? steel} (${format.length(thicknessMm)})`),
    )
    .map((kind) => String.fromCharCode(65 + (kind % 26)))
    .join('');
  return kinds.size > 1 && stack.layers.length <= 60 ? `${counts}; from the bottom ${order}` : counts;
}

function blankWords(design: Design, format: Format): string {
  const { blank } = design;
  return blank ? format.size([blank.lengthMm, blank.widthMm, blank.thicknessMm]) : 'none';
}

function allowanceWords(name: keyof Allowances, value: number, format: Format): string {
  switch (ALLOWANCE_DEFAULTS[name].unit) {
    case 'mm':
      return format.length(value);
    case '°C':
      return format.temperature(value);
    case 'min':
      return format.duration(value);
  }
}

function outcomeWords(design: Design, format: Format): string {
  const { result, totals } = evaluate(design);
  if (!result || !totals) return 'a step can’t be done';
  const { lengthMm, widthMm, thicknessMm, layers } = result.bar;
  return `${format.size([lengthMm, widthMm, thicknessMm])}, ${format.count(layers)} layers, ${format.mass(totals.endMassKg)}`;
}
