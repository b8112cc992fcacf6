import { type Stack, STARTERS, type Starter } from '@shared/design';
import { evaluate, type Forging } from '@shared/forging';
import { findSteel, toneOf } from '@shared/steels';
import { kindOf } from '@shared/steps';

/** A starter with what comes of it. */
export interface ForgedStarter {
  readonly starter: Starter;
  readonly forging: Forging;
}

let forged: readonly ForgedStarter[] | undefined;

/** All starters, worked out once. */
export function forgedStarters(): readonly ForgedStarter[] {
  forged ??= STARTERS.map((starter) => ({ starter, forging: evaluate(starter.design) }));
  return forged;
}

/** The starter for whoever just wants to begin: thirteen layers, restacked once. */
export function plainestStarter(): Starter {
  return STARTERS[0] as Starter;
}

/** A layer as it is drawn on a stack's end, mm from the top left. */
export interface DrawnLayer {
  readonly y: number;
  readonly height: number;
  readonly fill: string;
}

/** A stack seen from its end. */
export interface DrawnStack {
  readonly barId: string;
  readonly name: string;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly layers: readonly DrawnLayer[];
}

/** The ends of all stacks of a design, in its order; pictures have their top first. */
export function drawnStacks({ design }: Forging): readonly DrawnStack[] {
  return design.bars.flatMap((bar) =>
    bar.start.kind === 'stack' ? [{ barId: bar.id, name: bar.name, ...drawnStack(bar.start) }] : [],
  );
}

function drawnStack(stack: Stack): Pick<DrawnStack, 'widthMm' | 'heightMm' | 'layers'> {
  const layers: DrawnLayer[] = [];
  let y = 0;
  for (const { steel, thicknessMm } of [...stack.layers].reverse()) {
    layers.push({ y, height: thicknessMm, fill: fillOf(steel) });
    y += thicknessMm;
  }
  return { widthMm: stack.widthMm, heightMm: y, layers };
}

/** The etched tone of a catalogue steel. */
export function fillOf(steelId: string): string {
  const steel = findSteel(steelId);
  return steel ? toneOf(steel).hex : 'none';
}

/** What is done to the bar that becomes the billet: "Forge weld → Draw out → Trim the ends". */
export function stepsOf({ design }: Forging): string {
  const bar = design.bars.find(({ id }) => id === design.result);
  if (bar === undefined) return '';
  const { start, steps } = bar;
  const laid =
    start.kind === 'assembly'
      ? [`${start.pieces.length} pieces ${start.along === 'width' ? 'side by side' : 'on each other'}`]
      : [];
  return [...laid, ...steps.map((step) => kindOf(step).words.name)].join(' → ');
}
