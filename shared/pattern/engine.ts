import { type Kernel, kernelTracer } from './kernel/kernel.js';
import type { Program } from './program/program.js';
import { referenceTracer } from './reference/tracer.js';
import type { Tracer } from './tracer.js';

/** Folds past which the reference takes over. */
export const MOST_KERNEL_FOLDS = 12;

/** Points on which single precision is tried. */
const PROBES = 1024;
/**
 * Share of points that may be expected on another layer for single precision to be used: a third of what the agreement
 * between the engines allows.
 */
const TOLERATED_SHARE = 3e-4;

/**
 * The quickest tracer that is exact enough for a program: the kernel in single precision; in double where folds and
 * draws magnify its rounding too much; the reference past twelve folds and where the kernel doesn't run. The choice
 * depends on the program alone, so every host with the kernel makes the same picture.
 */
export function tracerFor(program: Program, kernel: Kernel | null): Tracer {
  if (kernel === null || program.folds > MOST_KERNEL_FOLDS) return referenceTracer(program);
  const single = kernelTracer(kernel, program, 'f32');
  return misplacedShare(single, kernelTracer(kernel, program, 'f64', PROBES)) <= TOLERATED_SHARE
    ? single
    : kernelTracer(kernel, program, 'f64');
}

/**
 * Share of points that single precision is expected to put on another layer: the mean of the heights by which the two
 * differ in the stack, over the thickness of the layer. Taken over points that both put on one layer, as there are too few of the
 * others for a count.
 */
function misplacedShare(single: Tracer, double: Tracer): number {
  const { program } = single;
  for (let i = 0; i < PROBES; i++) {
    // The additive sequence of the plastic number's powers fills a box evenly (from memory: M. Roberts, 2018).
    const x = ((i + 1) * 0.8191725133961645) % 1;
    const y = ((i + 1) * 0.6710436067037893) % 1;
    const z = ((i + 1) * 0.5497004779019703) % 1;
    single.x[i] = x * program.lengthMm;
    single.y[i] = y * program.widthMm;
    single.z[i] = z * program.thicknessMm;
    double.x[i] = x * program.lengthMm;
    double.y[i] = y * program.widthMm;
    double.z[i] = z * program.thicknessMm;
  }
  single.run(PROBES);
  double.run(PROBES);
  let sum = 0;
  let same = 0;
  for (let i = 0; i < PROBES; i++) {
    const layer = single.layer[i] as number;
    if (layer !== double.layer[i]) continue;
    same += 1;
    const apartMm = Math.abs((single.z[i] as number) - (double.z[i] as number));
    sum += apartMm / layerThicknessMm(program, layer);
  }
  return same === 0 ? 1 : sum / same;
}

/** Thickness of a layer in its stack, mm. */
export function layerThicknessMm(program: Program, layer: number): number {
  const top = program.layerTopMm[layer] as number;
  return program.layerPlace[layer] === 0 ? top : top - (program.layerTopMm[layer - 1] as number);
}
