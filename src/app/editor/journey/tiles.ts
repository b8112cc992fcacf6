import { massKg } from '@shared/bar';
import { WARNING_SEVERITIES, type Warning, type WarningSeverity } from '@shared/checks';
import type { Bar } from '@shared/design';
import type { ForgedBar, ForgedState, StepRefusal } from '@shared/forging';
import { kindOf } from '@shared/steps';
import type { Format } from '@shared/units';

/** One stop of a bar's journey. */
export interface Tile {
  /** Null for the start. */
  readonly stepId: string | null;
  /** 0 for the start. */
  readonly place: number;
  readonly name: string;
  /** What is done, in full. */
  readonly instruction: string;
  /** Null where nothing was computed: at a refused step and after it. */
  readonly state: ForgedState | null;
  /** "270 × 40 × 7 mm"; empty without a state. */
  readonly size: string;
  /** "52 layers, 640 g"; empty without a state. */
  readonly content: string;
  /** Why the step can't be done; null if it can. */
  readonly refusal: string | null;
  readonly isOff: boolean;
  /** The gravest of its warnings; null without any. */
  readonly severity: WarningSeverity | null;
  readonly warnings: number;
}

/** The stops of one bar, its start first. */
export function tilesOf(
  bar: Bar,
  forged: ForgedBar,
  warnings: readonly Warning[],
  format: Format,
  refusalWords: (refusal: StepRefusal) => string,
): readonly Tile[] {
  const { refusal } = forged;
  const ofBar = warnings.filter((warning) => warning.bar === bar.id);
  const tile = (stepId: string | null, place: number): Omit<Tile, 'name' | 'instruction' | 'isOff'> => {
    const state = forged.states[place] ?? null;
    const own = ofBar.filter((warning) => warning.stepId === stepId);
    const isRefused = refusal !== null && (refusal.step?.id ?? null) === stepId;
    return {
      stepId,
      place,
      state,
      ...(state ? stateWords(state, format) : { size: '', content: '' }),
      refusal: isRefused ? refusalWords(refusal) : null,
      severity:
        WARNING_SEVERITIES.find((severity) => own.some((warning) => warning.severity === severity)) ?? null,
      warnings: own.length,
    };
  };
  const start: Tile = {
    ...tile(null, 0),
    name: bar.start.kind === 'stack' ? 'Stack' : 'Put together',
    instruction: startWords(bar, format),
    isOff: false,
  };
  return [
    start,
    ...bar.steps.map((step, i) => ({
      ...tile(step.id, i + 1),
      name: kindOf(step).words.name,
      instruction: kindOf(step).words.instruction(step, format),
      isOff: step.isOff === true,
    })),
  ];
}

/** Words of states that an edit left alone are not made again. */
const wordsMade = new WeakMap<ForgedState, { format: Format; size: string; content: string }>();

function stateWords(state: ForgedState, format: Format): Pick<Tile, 'size' | 'content'> {
  const made = wordsMade.get(state);
  if (made?.format === format) return made;
  const { lengthMm, widthMm, thicknessMm, densityKgM3, layers } = state.bar;
  const mass = format.mass(massKg(lengthMm * widthMm * thicknessMm, densityKgM3));
  const words = {
    format,
    size: format.size([lengthMm, widthMm, thicknessMm]),
    content: `${format.count(layers)} ${layers === 1 ? 'layer' : 'layers'}, ${mass}`,
  };
  wordsMade.set(state, words);
  return words;
}

function startWords(bar: Bar, format: Format): string {
  const { start } = bar;
  return start.kind === 'stack'
    ? `Stack of ${format.count(start.layers.length)} layers`
    : `${format.count(start.pieces.length)} pieces ${start.along === 'thickness' ? 'on top of each other' : 'side by side'}`;
}
