import type { Bar } from '../design/index.js';
import type { ForgedBar, Forging } from '../forging/index.js';
import { type Steel, nominalPercent } from '../steels/index.js';
import { isResizing, ratiosOf, stackBandsMm } from './band-thickness.js';
import { type CarbonPart, carbonAffinityOf, isCarbonBarrier, levelCarbonPercent } from './carbon-activity.js';
import { carbonDiffusivityM2PerS } from './carbon-diffusion.js';
import {
  type CarbonShift,
  type LevelledStack,
  NO_SHIFT,
  levelledPieces,
  levelledStack,
} from './carbon-parts.js';
import { type BarContents, contentsOf, sharesOfResult } from './contents.js';
import { heatTemperatureC } from './heats.js';
import { layerMeanResidual } from './lamella.js';

/** Carbon of one material before and after all heats, wt%. */
export interface LayerCarbon {
  /** Id of the material. */
  readonly steel: string;
  readonly startPercent: number;
  /** Mean over all layers of the material in the result. */
  readonly endPercent: number;
}

/** What the heats made of the carbon in the result. */
export interface CarbonAfter {
  /** By mass, over the materials that exchange carbon. */
  readonly meanPercent: number;
  /** 0: as laid; 1: level in activity. */
  readonly levelled: number;
  readonly layers: readonly LayerCarbon[];
  /** Ids of materials planned as barriers (nickel, copper): they keep their carbon and are left out of the mean. */
  readonly barriers: readonly string[];
}

/** Below this there is no austenite and no carbon is counted as moving, °C (eutectoid, Fe–C diagram, from memory). */
const AUSTENITE_FROM_C = 727;

/**
 * Carbon in the result, layer by layer, after the heats of every bar that ends in it.
 *
 * A bar is levelled on its own scale: a stack over its bands, an assembly over its pieces (each as one layer with its
 * own mean). For each, Fo = Σ D·t/d² runs over its own heats and those of the bars it goes into, d being the mean
 * thickness of its bands (pieces) in that heat; within a draw of n heats the thickness falls by the same factor from
 * heat to heat, and a heat acts on the thickness it starts with. Past a twist or an assembly d follows the bar's
 * later reduction (`thicknessRatio`). Carbon goes from where it was towards level activity by 1 − the layer-mean
 * residual of Fo; the mean is kept. `levelled` is the mean of that over stacks and assemblies, weighted by how far
 * carbon has to go in each. Where nothing can move it is 1 if carbon is level as laid, 0 if a barrier keeps it apart.
 *
 * Not counted: carbon lost at the skin, heats below 727 °C, what seeps through nickel.
 * **Source**: Ågren’s diffusivity at the bar's mean carbon; Fourier series of layers; carbon activity after Gunnarson.
 * **Accuracy**: the published diffusivities differ by a factor of 2.5, so Fo does too.
 * @returns null while there is no result
 */
export function carbonAfter(forging: Forging): CarbonAfter | null {
  if (forging.result === null) return null;
  const shares = sharesOfResult(forging);
  const contents = contentsOf(forging);
  const work = workOf(forging, contents, shares);
  const ends = new Map<number, { mass: number; carbon: number }>();
  let toGo = 0;
  let gone = 0;
  for (const bar of forging.design.bars) {
    const share = shares.get(bar.id);
    const own = work.get(bar.id);
    if (share === undefined || own === undefined) continue;
    toGo += share * own.toGo;
    gone += share * own.toGo * own.levelled;
    for (const { steel, part, group, endPercent } of own.constituents) {
      const shift = group === null ? NO_SHIFT : own.shift;
      const sum = ends.get(steel) ?? { mass: 0, carbon: 0 };
      sum.mass += share * part.mass;
      sum.carbon += share * part.mass * (shift.factor * endPercent + shift.offset * part.affinity);
      ends.set(steel, sum);
    }
  }
  const result = contents.get(forging.design.result) as BarContents;
  return summary(forging, result, ends, toGo > 0 ? gone / toGo : isLevel(forging, result) ? 1 : 0);
}

/** Whether carbon is level in a bar as it was laid; where it is not and can't move, a barrier is in the way. */
function isLevel(forging: Forging, contents: BarContents): boolean {
  const parts = [...contents.massBySteel].flatMap(([index, mass]): CarbonPart[] => {
    const steel = forging.steels[index] as Steel;
    if (isCarbonBarrier(steel)) return [];
    return [{ mass, carbonPercent: nominalPercent(steel, 'C'), affinity: carbonAffinityOf(steel) }];
  });
  return levelCarbonPercent(parts).every(
    (level, i) => Math.abs(level - (parts[i] as CarbonPart).carbonPercent) < 1e-9,
  );
}

function summary(
  forging: Forging,
  result: BarContents,
  ends: ReadonlyMap<number, { mass: number; carbon: number }>,
  levelled: number,
): CarbonAfter {
  const indexes = [...result.massBySteel.keys()].sort((a, b) => a - b);
  const steelAt = (index: number): Steel => forging.steels[index] as Steel;
  const taking = indexes.filter((index) => !isCarbonBarrier(steelAt(index)));
  const counted = taking.length > 0 ? taking : indexes;
  let mass = 0;
  let carbon = 0;
  for (const index of counted) {
    const share = result.massBySteel.get(index) as number;
    mass += share;
    carbon += share * nominalPercent(steelAt(index), 'C');
  }
  return {
    meanPercent: carbon / mass,
    levelled,
    layers: indexes.map((index) => {
      const end = ends.get(index);
      const startPercent = nominalPercent(steelAt(index), 'C');
      return {
        steel: steelAt(index).id,
        startPercent,
        endPercent: end && end.mass > 0 ? end.carbon / end.mass : startPercent,
      };
    }),
    barriers: indexes.filter((index) => !taking.includes(index)).map((index) => steelAt(index).id),
  };
}

/** What happens to the carbon of a bar: of its constituents in a stack, of its pieces in an assembly. */
interface BarWork {
  readonly levelled: number;
  /** Mean distance to level activity, wt%, for each unit of the bar's mass. */
  readonly toGo: number;
  /** Of a stack: its constituents (masses add up to 1) and their carbon once levelled within the bar. */
  readonly constituents: LevelledStack['constituents'];
  /** What later assemblies do to the carbon of all that comes from this bar. */
  readonly shift: CarbonShift;
}

/** Goes from the result back to the stacks, since what later bars do to a bar's carbon is known first. */
function workOf(
  forging: Forging,
  contents: ReadonlyMap<string, BarContents>,
  shares: ReadonlyMap<string, number>,
): ReadonlyMap<string, BarWork> {
  const work = new Map<string, BarWork>();
  /** For each bar, over its pieces in later bars and weighted by mass: Σ D·t/ratio² of their heats, and the shift. */
  const later = new Map<string, { diffusedM2: number; shift: CarbonShift }>();
  for (let b = forging.bars.length - 1; b >= 0; b--) {
    const bar = forging.design.bars[b] as Bar;
    const forged = forging.bars[b] as ForgedBar;
    const own = contents.get(bar.id);
    const share = shares.get(bar.id);
    if (own === undefined || share === undefined) continue;
    const { diffusedM2, shift } = later.get(bar.id) ?? { diffusedM2: 0, shift: NO_SHIFT };
    const ratios = ratiosOf(forged, forging.allowances);
    const meanPercent = meanCarbonPercent(forging, own);
    const last = ratios.length - 1;
    const inLater = diffusedM2 / (ratios[last] as number) ** 2;
    const isStack = bar.start.kind === 'stack';
    const thicknessMm = isStack ? stackBandsMm(forged, forging.allowances) : piecesMm(bar, forged, ratios);
    const fo =
      diffusedPerSquareM(forging, forged, thicknessMm, meanPercent) +
      diffusedM2 / ((thicknessMm[last] as number) * 1e-3) ** 2;
    const levelled = 1 - layerMeanResidual(fo);
    if (isStack) {
      work.set(bar.id, { levelled, shift, ...levelledStack(forging, bar, levelled) });
      continue;
    }
    const pieces = levelledPieces(forging, bar, own, contents, levelled);
    work.set(bar.id, { levelled, shift, toGo: pieces.toGo, constituents: [] });
    const fromHere =
      diffusedPerSquareM(
        forging,
        forged,
        ratios.map((ratio) => ratio * 1e3),
        meanPercent,
      ) + inLater;
    own.pieces.forEach((piece, i) => {
      const before = later.get(piece.from) ?? { diffusedM2: 0, shift: { factor: 0, offset: 0 } };
      const weight = (share * piece.massFraction) / (shares.get(piece.from) as number);
      const here = pieces.shifts[i] as CarbonShift;
      later.set(piece.from, {
        diffusedM2: before.diffusedM2 + weight * fromHere,
        shift: {
          factor: before.shift.factor + weight * shift.factor * here.factor,
          offset: before.shift.offset + weight * (shift.factor * here.offset + shift.offset),
        },
      });
    });
  }
  return work;
}

/**
 * Σ D·t/d² over the heats of a bar, without unit for `thicknessMm` in mm.
 * @param thicknessMm of the layers in each state of the bar
 */
function diffusedPerSquareM(
  forging: Forging,
  bar: ForgedBar,
  thicknessMm: readonly number[],
  meanPercent: number,
): number {
  let sum = 0;
  bar.states.forEach((state, i) => {
    if (state.step === null || state.heats === 0) return;
    const temperatureC = heatTemperatureC(state.step, forging.allowances);
    if (temperatureC < AUSTENITE_FROM_C) return;
    const diffusivity = carbonDiffusivityM2PerS(temperatureC, meanPercent);
    const secondsPerHeat = (state.minutesAtHeat * 60) / state.heats;
    const beforeM = (thicknessMm[i - 1] as number) * 1e-3;
    const step = isResizing(state.step) ? ((thicknessMm[i] as number) * 1e-3) / beforeM : 1;
    for (let heat = 0; heat < state.heats; heat++) {
      sum += (diffusivity * secondsPerHeat) / (beforeM * step ** (heat / state.heats)) ** 2;
    }
  });
  return sum;
}

/** Mean carbon of what takes part in a bar, wt%; 0 when nothing does. */
function meanCarbonPercent(forging: Forging, contents: BarContents): number {
  let mass = 0;
  let carbon = 0;
  for (const [index, share] of contents.massBySteel) {
    const steel = forging.steels[index] as Steel;
    if (isCarbonBarrier(steel)) continue;
    mass += share;
    carbon += share * nominalPercent(steel, 'C');
  }
  return mass > 0 ? carbon / mass : 0;
}

/** Thickness in mm of an assembly's pieces as layers in each state; neighbours cut from one bar are one layer. */
function piecesMm(bar: Bar, forged: ForgedBar, ratios: readonly number[]): readonly number[] {
  if (bar.start.kind !== 'assembly') return [];
  const { along, pieces } = bar.start;
  const start = forged.states[0]?.bar;
  const extentMm = start ? (along === 'thickness' ? start.thicknessMm : start.widthMm) : 0;
  const runs = pieces.reduce((count, piece, i) => count + (pieces[i - 1]?.bar === piece.bar ? 0 : 1), 0);
  return ratios.map((ratio) => (ratio * extentMm) / runs);
}
