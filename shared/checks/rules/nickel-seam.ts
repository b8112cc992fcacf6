import { type BarState, type Section, sectionAcross } from '../../bar/index.js';
import type { Forging } from '../../forging/index.js';
import { isPureNickel } from '../../metallurgy/index.js';
import type { Steel } from '../../steels/index.js';
import type { Step } from '../../steps/index.js';
import { type Finding, check } from '../check.js';
import { type WorkedStep, allWorkedSteps } from '../walk.js';

type Values = { seams: number; at: 'fold' | 'restack' | 'slice' | 'assembly' | 'stack' };

/** Seams at which two faces of pure nickel meet. Only the faces are looked at, never the layers between. */
export const nickelSeam = check<Values>({
  code: 'nickel-seam',
  source:
    'Advice in a knife-maker forum (published): never let two nickel faces meet; nickel oxide dissolves badly in borax, ' +
    'so nickel welds to steel but hardly to nickel',
  find: (forging) => {
    const isNickel = forging.steels.map(isPureNickel);
    if (!isNickel.includes(true)) return [];
    return [
      ...laid(forging, isNickel),
      ...allWorkedSteps(forging).flatMap((worked) => joined(worked, isNickel)),
    ];
  },
  words: ({ seams, at }, _severity, format) => {
    const where = {
      fold: 'in this fold',
      restack: 'in this restack',
      slice: 'between the slices',
      assembly: 'between the pieces',
      stack: 'in this stack',
    }[at];
    return {
      message: `Nickel meets nickel at ${format.count(seams)} ${seams === 1 ? 'seam' : 'seams'} ${where}. Its oxide dissolves badly in flux: nickel welds to steel, but hardly to itself.`,
      remedy:
        at === 'stack'
          ? 'Lay steel between the nickel layers.'
          : 'Close the stack with steel on the outside, grind the nickel off the faces that meet, or lay a sheet of steel between.',
    };
  },
});

function laid(forging: Forging, isNickel: readonly boolean[]): readonly Finding<Values>[] {
  return forging.design.bars.flatMap((bar, b): readonly Finding<Values>[] => {
    const forged = forging.bars[b];
    if (forged === undefined || forged.states.length === 0) return [];
    if (bar.start.kind === 'stack') {
      const nickel = new Set(forging.steels.filter(isPureNickel).map((steel: Steel) => steel.id));
      const seams = bar.start.layers.filter(
        (layer, i, layers) => nickel.has(layer.steel) && nickel.has(layers[i - 1]?.steel ?? ''),
      ).length;
      return found(seams, bar.id, null, 'stack');
    }
    const { along } = bar.start;
    const faces = forged.pieces.map((piece: BarState) => facesOf(sectionAcross(piece, along), isNickel));
    const seams = faces.filter((piece, i) => piece.first && faces[i - 1]?.last).length;
    return found(seams, bar.id, null, 'assembly');
  });
}

/** Nickel seams that a step makes: its section holds the pieces one after another. */
function joined(
  { bar, step, before, after }: WorkedStep,
  isNickel: readonly boolean[],
): readonly Finding<Values>[] {
  const pieces = piecesMade(step);
  const { section } = after.bar;
  // Seen from the side, only edges of layers meet; a section that didn't grow has no seam across it.
  if (pieces === 1 || section === null || before.lie !== 'thickness' || section.steels.length % pieces !== 0)
    return [];
  const layers = section.steels.length / pieces;
  let seams = 0;
  for (let piece = 1; piece < pieces; piece++) {
    const upper = isNickel[section.steels[piece * layers] as number];
    if (upper && isNickel[section.steels[piece * layers - 1] as number]) seams += 1;
  }
  return found(seams, bar.id, step.id, step.kind as Values['at']);
}

function piecesMade(step: Step): number {
  if (step.kind === 'fold') return 2;
  if (step.kind === 'restack') return step.pieces;
  return step.kind === 'slice' ? step.count : 1;
}

function facesOf(section: Section | null, isNickel: readonly boolean[]): { first: boolean; last: boolean } {
  if (section === null) return { first: false, last: false };
  const { steels } = section;
  const at = (index: number): boolean => isNickel[steels[index] as number] ?? false;
  return { first: at(0), last: at(steels.length - 1) };
}

function found(
  seams: number,
  bar: string,
  stepId: string | null,
  at: Values['at'],
): readonly Finding<Values>[] {
  return seams === 0 ? [] : [{ severity: 'caution', bar, stepId, values: { seams, at } }];
}
