import type { Axis } from '../bar/index.js';
import type { Warning } from '../checks/index.js';
import type { Bar, Design, Stack } from '../design/index.js';
import { type ForgedBar, type ForgedState, type Forging, type State, figuresOf } from '../forging/index.js';
import { type Step, kindOf } from '../steps/index.js';
import { type Format, formatLengthFraction } from '../units/index.js';
import { type Caution, GENERAL_CAUTION, cautionsFor } from './cautions.js';
import { stackRecipe } from './stack-recipe.js';
import { forgingToleranceMm } from './tolerance.js';

/** A figure with its name. */
export interface CardFact {
  readonly label: string;
  readonly value: string;
}

/** A size to reach, with how near, and room beside it for what was reached. */
export interface CardTarget {
  readonly label: 'Length' | 'Width' | 'Thickness';
  readonly value: string;
  readonly tolerance: string;
}

export interface CardStep {
  /** Counted through each bar from 1. */
  readonly number: number;
  readonly name: string;
  readonly instruction: string;
  /** "3 heats, about 1200 °C, 5 min each"; empty for cold work. */
  readonly heat: string;
  readonly note: string;
  readonly targets: readonly CardTarget[];
  readonly facts: readonly CardFact[];
  /** What to mind at this step. */
  readonly warnings: readonly string[];
}

export interface CardBar {
  readonly id: string;
  readonly name: string;
  readonly isResult: boolean;
  /** What it is put together from, a line each, bottom or left first. */
  readonly start: readonly string[];
  readonly startSize: string;
  readonly steps: readonly CardStep[];
  /** Why the bar stops before its last step; empty when nothing is in the way. */
  readonly refusal: string;
}

/** What the forge card says, in the reader's units; how it looks is up to whoever prints or shows it. */
export interface ForgeCard {
  readonly title: string;
  readonly note: string;
  readonly facts: readonly CardFact[];
  readonly bars: readonly CardBar[];
  /** Warnings that belong to no step. */
  readonly warnings: readonly string[];
  readonly cautions: readonly Caution[];
  readonly generalCaution: string;
}

/** What the card can't work out by itself. */
export interface CardContext {
  readonly format: Format;
  readonly warnings: readonly Warning[];
  readonly refusalWords: (bar: ForgedBar) => string;
}

/** The forge card of a design: every bar that ends in the result, with its steps and the sizes to reach. */
export function forgeCard(forging: Forging, context: CardContext): ForgeCard {
  const { design } = forging;
  return {
    title: design.name,
    note: design.note ?? '',
    facts: cardFacts(forging, context.format),
    bars: forging.bars.filter((bar) => bar.endsInResult).map((bar) => cardBar(design, bar, forging, context)),
    warnings: context.warnings.filter((warning) => warning.stepId === null).map(warningText),
    cautions: cautionsFor(forging),
    generalCaution: GENERAL_CAUTION,
  };
}

function cardFacts(forging: Forging, format: Format): readonly CardFact[] {
  const { totals, result, design } = forging;
  const facts: CardFact[] = [];
  if (result && totals) {
    const end = figuresOf(result);
    facts.push(
      { label: 'Stock', value: format.mass(totals.startMassKg) },
      { label: 'Billet', value: format.mass(totals.endMassKg) },
      { label: 'Yield', value: format.percent(totals.yieldPercent / 100) },
      { label: 'Layers', value: layersText(end, format) },
      { label: 'Welds', value: format.count(totals.welds) },
      { label: 'Heats', value: format.count(totals.heats) },
      { label: 'Ends at', value: format.size([end.lengthMm, end.widthMm, end.thicknessMm]) },
    );
  }
  if (design.blank) {
    const { lengthMm, widthMm, thicknessMm } = design.blank;
    facts.push({ label: 'For a blank of', value: format.size([lengthMm, widthMm, thicknessMm]) });
  }
  return facts;
}

function cardBar(design: Design, forged: ForgedBar, forging: Forging, context: CardContext): CardBar {
  const bar = design.bars.find((candidate) => candidate.id === forged.id) as Bar;
  const { format } = context;
  const start = forged.states[0];
  const steps = forged.states.slice(1).filter((state) => !state.step?.isOff);
  return {
    id: bar.id,
    name: bar.name,
    isResult: bar.id === design.result,
    start:
      bar.start.kind === 'stack'
        ? stackLines(bar.start, forging, format)
        : pieceLines(design, bar, forged, format),
    startSize: start ? format.size([start.bar.lengthMm, start.bar.widthMm, start.bar.thicknessMm]) : '',
    steps: steps.map((state, i) => cardStep(state, i + 1, forging, context)),
    refusal: forged.refusal ? context.refusalWords(forged) : '',
  };
}

function cardStep(state: ForgedState, number: number, forging: Forging, context: CardContext): CardStep {
  const { format } = context;
  const step = state.step as Step;
  const kind = kindOf(step);
  const figures = figuresOf(state);
  return {
    number,
    name: kind.words.name,
    instruction: kind.words.instruction(step, format),
    heat: heatText(step, forging, format),
    note: step.note ?? '',
    targets: [
      target('Length', 'length', figures.lengthMm, format),
      target('Width', 'width', figures.widthMm, format),
      target('Thickness', 'thickness', figures.thicknessMm, format),
    ],
    facts: [
      { label: 'Layers', value: layersText(figures, format) },
      { label: 'Mass', value: format.mass(figures.massKg) },
    ],
    warnings: context.warnings.filter((warning) => warning.stepId === step.id).map(warningText),
  };
}

function target(label: CardTarget['label'], axis: Axis, sizeMm: number, format: Format): CardTarget {
  const toleranceMm = forgingToleranceMm(axis, sizeMm);
  return {
    label,
    value: anvilLength(axis, sizeMm, format),
    tolerance: `± ${anvilLength(axis, toleranceMm, format)}`,
  };
}

/** A size as it is read off a rule at the anvil: lengths to 1 mm or 1/16 in, sections to 0.1 mm or 1/64 in. */
function anvilLength(axis: Axis, sizeMm: number, format: Format): string {
  if (axis === 'length') return format.roughLength(sizeMm);
  if (format.system === 'mm') return format.length(sizeMm, { digits: 1 });
  return formatLengthFraction(sizeMm, 64);
}

function heatText(step: Step, forging: Forging, format: Format): string {
  const heats = step.heats ?? 0;
  if (heats === 0) return '';
  const { allowances } = forging;
  const temperatureC =
    step.temperatureC ?? (step.kind === 'weld' ? allowances.weldTemperatureC : allowances.forgeTemperatureC);
  const minutes = step.minutesPerHeat ?? allowances.minutesPerHeat;
  return [
    `${format.count(heats)} ${heats === 1 ? 'heat' : 'heats'}`,
    `about ${format.temperature(temperatureC, { step: 5 })}`,
    heats === 1 ? format.duration(minutes) : `${format.duration(minutes)} each`,
  ].join(', ');
}

/** "49 bands of 52 layers", or the layers alone where bands can't be counted or are the same. */
export function layersText(figures: Pick<State, 'layers' | 'bands'>, format: Format): string {
  if (figures.bands === null || figures.bands === figures.layers) return format.count(figures.layers);
  return `${format.count(figures.layers)} laid, ${format.count(figures.bands)} seen`;
}

function stackLines(stack: Stack, forging: Forging, format: Format): readonly string[] {
  const nameOf = (id: string): string => forging.steels.find((steel) => steel.id === id)?.name ?? id;
  return stackRecipe(stack.layers).map(({ times, layers }) => {
    const group = layers
      .map((layer) => `${nameOf(layer.steel)} ${format.length(layer.thicknessMm)}`)
      .join(' + ');
    if (times === 1) return group;
    return layers.length === 1 ? `${format.count(times)} × ${group}` : `${format.count(times)} × (${group})`;
  });
}

function pieceLines(design: Design, bar: Bar, forged: ForgedBar, format: Format): readonly string[] {
  if (bar.start.kind !== 'assembly') return [];
  const nameOf = (id: string): string => design.bars.find((candidate) => candidate.id === id)?.name ?? id;
  const place = bar.start.along === 'thickness' ? 'from the bottom' : 'from the left';
  return bar.start.pieces.map((piece, i) => {
    const turns = piece.quarterTurns ?? 0;
    const size = forged.pieces[i];
    return [
      `${i + 1} ${i === 0 ? place : ''}`.trim() + `: ${nameOf(piece.bar)}`,
      size && format.size([size.lengthMm, size.widthMm, size.thicknessMm]),
      turns > 0 &&
        (turns === 2 ? 'turned over' : `turned ${turns === 1 ? 'a quarter right' : 'a quarter left'}`),
      piece.endForEnd && 'end for end',
    ]
      .filter(Boolean)
      .join(', ');
  });
}

function warningText(warning: Warning): string {
  return `${warning.message} ${warning.remedy}`.trim();
}
