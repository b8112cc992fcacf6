import type { Design } from '../../design/index.js';
import { type Forging, evaluate } from '../../forging/index.js';
import { type Moment, compile } from '../program/compile.js';
import type { Program } from '../program/program.js';
import { referenceTracer } from '../reference/tracer.js';
import type { Tracer } from '../tracer.js';
import type { Random } from './random.js';

/** Where a point of a bar came from. */
export interface Origin {
  readonly bar: string;
  readonly steel: string;
  /** The bottom layer is 0. */
  readonly layer: number;
  /** In the stack, mm. */
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

export function programOf(design: Design, at?: Moment): Program {
  return programOfForging(evaluate(design), at);
}

export function programOfForging(forging: Forging, at?: Moment): Program {
  const program = compile(forging, at);
  if (program === null) throw new RangeError('programOf: the design has no such state');
  return program;
}

/** Takes one point back on the reference engine. */
export function originOf(program: Program, x: number, y: number, z: number): Origin {
  return origins(referenceTracer(program, 4), [[x, y, z]])[0] as Origin;
}

/** Takes points back on an engine, batch by batch. */
export function origins(
  tracer: Tracer,
  points: readonly (readonly [number, number, number])[],
): readonly Origin[] {
  const { program } = tracer;
  const found: Origin[] = [];
  for (let first = 0; first < points.length; first += tracer.capacity) {
    const batch = points.slice(first, first + tracer.capacity);
    batch.forEach(([x, y, z], i) => {
      tracer.x[i] = x;
      tracer.y[i] = y;
      tracer.z[i] = z;
    });
    tracer.run(batch.length);
    batch.forEach((_, i) => {
      const layer = tracer.layer[i] as number;
      found.push({
        bar: program.barIds[program.layerBar[layer] as number] as string,
        steel: program.steelIds[program.layerSteel[layer] as number] as string,
        layer: program.layerPlace[layer] as number,
        x: tracer.x[i] as number,
        y: tracer.y[i] as number,
        z: tracer.z[i] as number,
      });
    });
  }
  return found;
}

/** Points spread evenly over the bar that the program shows. */
export function pointsIn(
  program: Program,
  random: Random,
  count: number,
): readonly (readonly [number, number, number])[] {
  const { lengthMm, widthMm, thicknessMm } = program;
  return Array.from(
    { length: count },
    () => [random() * lengthMm, random() * widthMm, random() * thicknessMm] as const,
  );
}
