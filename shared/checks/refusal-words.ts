import type { Design } from '../design/index.js';
import type { StepRefusal } from '../forging/index.js';
import { type Field, type Step, kindOf } from '../steps/index.js';
import type { Format } from '../units/index.js';
import { counted } from './say.js';

/**
 * Why a bar stops, with its place: “Restack” in “Billet”: 4 pieces need 4.5 mm of saw cuts, the bar is 3 mm long.
 * Names the step (or the start), what asks for too much, and both numbers.
 */
export function refusalWords(refusal: StepRefusal, design: Pick<Design, 'bars'>, format: Format): string {
  const bar = design.bars.find(({ id }) => id === refusal.bar);
  const name = bar?.name ?? refusal.bar;
  const place = refusal.step ? `“${kindOf(refusal.step).words.name}” in “${name}”` : `The start of “${name}”`;
  return `${place}: ${refusalReason(refusal, design, format)}`;
}

/** The same without the place: 4 pieces need 4.5 mm of saw cuts, the bar is 3 mm long. */
export function refusalReason(refusal: StepRefusal, design: Pick<Design, 'bars'>, format: Format): string {
  const { asked, available } = refusal;
  switch (refusal.code) {
    case 'nothing-left':
      return nothingLeft(refusal, format);
    case 'too-short':
      return tooShort(refusal, format);
    case 'cut-too-deep':
      return `“${fieldLabel(refusal)}” takes ${format.length(asked)} in all, the bar is ${format.length(available)} thick.`;
    case 'size-impossible':
      return sizeImpossible(refusal, format);
    case 'too-many-layers':
      return `“${fieldLabel(refusal)}” asks for ${format.count(asked)} layers, at most ${format.count(available)} can be followed.`;
    case 'unknown-steel':
      return `“${fieldLabel(refusal)}” asks for ${format.count(asked)} steels, ${format.count(available)} of them are known.`;
    case 'piece-refused': {
      const start = design.bars.find(({ id }) => id === refusal.bar)?.start;
      const from = start?.kind === 'assembly' ? start.pieces[asked - 1]?.bar : undefined;
      const piece = design.bars.find(({ id }) => id === from)?.name;
      const which = piece === undefined ? '' : ` (“${piece}”)`;
      return `piece ${format.count(asked)}${which} can’t be made, ${counted(available, 'piece is', 'pieces are', format)} there.`;
    }
  }
}

function nothingLeft(refusal: StepRefusal, format: Format): string {
  const asked = format.length(refusal.asked);
  const rest = `of ${format.length(refusal.available)}, nothing would be left.`;
  if (refusal.field === 'heats') {
    const heats = refusal.step?.heats ?? 0;
    return `the scale of ${counted(heats, 'heat', 'heats', format)} takes ${asked} ${rest}`;
  }
  if (refusal.step === null) return `trimming the pieces to fit takes ${asked} ${rest}`;
  return `“${fieldLabel(refusal)}” takes ${asked} ${rest}`;
}

function tooShort(refusal: StepRefusal, format: Format): string {
  const asked = format.length(refusal.asked);
  const bar = `the bar is ${format.length(refusal.available)} long.`;
  const { step } = refusal;
  if (step === null) return `the saw cuts between the pieces take ${asked}, ${bar}`;
  if (step.kind === 'restack') {
    return `${format.count(step.pieces)} pieces need ${asked} of saw cuts, ${bar}`;
  }
  if (step.kind === 'slice') {
    return `${counted(step.count, 'slice needs', 'slices need', format)} ${asked} with the saw cuts, ${bar}`;
  }
  if (step.kind === 'fold') return `a bar has to be longer than ${asked} to be folded, ${bar}`;
  return `“${fieldLabel(refusal)}” needs ${asked}, ${bar}`;
}

function sizeImpossible(refusal: StepRefusal, format: Format): string {
  const asked = `“${fieldLabel(refusal)}” asks for ${format.length(refusal.asked)}`;
  const available = format.length(refusal.available);
  const isOverdetermined =
    refusal.step?.kind === 'draw' &&
    refusal.step.lengthMm !== undefined &&
    refusal.step.widthMm !== undefined &&
    refusal.step.thicknessMm !== undefined;
  return isOverdetermined
    ? `${asked}, the volume gives ${available} at the length and width given. Leave one of the three out.`
    : `${asked}, the volume gives at most ${available}.`;
}

/** What the form calls the field; the field's own name for the start of a bar. */
function fieldLabel({ step, field }: StepRefusal): string {
  if (step === null) return field === 'pieces' ? 'Pieces' : field;
  if (field === 'kind') return kindOf<Step>(step).words.name;
  if (field === 'heats') return 'Heats';
  const own: Field | undefined = kindOf<Step>(step).fields[field];
  return own?.label ?? field;
}
