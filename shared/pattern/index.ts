export { MOST_KERNEL_FOLDS, layerThicknessMm, tracerFor } from './engine.js';
export { type Kernel, type Precision, kernelOf, kernelTracer } from './kernel/kernel.js';
export { type Moment, compile } from './program/compile.js';
export { type Program, entryOps } from './program/program.js';
export { referenceTracer } from './reference/tracer.js';
export type { Engine, Tracer } from './tracer.js';
export { edgeSteels, type EdgeShare } from './surfaces/edge.js';
export { type Blade, bladeOf } from './surfaces/blade.js';
export { type Outline, outlinePoints } from './surfaces/outline.js';
export {
  FACES,
  type Face,
  type Surface,
  type SurfaceMap,
  type SurfacePoints,
  WHOLE,
  type Window,
} from './surfaces/surface.js';
export { type PixelPoints, surfaceMap, surfacePoints } from './surfaces/surface-map.js';
export { type Look, PLAIN_LOOK, USUAL_LOOK } from './picture/look.js';
export { type Pixels, paint, paintSteelIndex } from './picture/paint.js';
export { Picture, STAGES, type Stage } from './picture/picture.js';
export type { PictureRequest } from './picture/request.js';
export type { Counters } from './picture/sampler.js';
export { NO_METAL, type Samples } from './picture/samples.js';
