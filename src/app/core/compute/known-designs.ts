import type { Blank, Design } from '@shared/design';
import { type Forging, evaluate } from '@shared/forging';
import {
  type Kernel,
  type Moment,
  type Program,
  type Tracer,
  compile,
  kernelOf,
  referenceTracer,
  tracerFor,
} from '@shared/pattern';
import type { Steel } from '@shared/steels';

/** A state of a bar made ready for tracing. */
export interface Ready {
  readonly program: Program;
  /** The steels that the program counts in. */
  readonly steels: readonly Steel[];
  readonly blank: Blank | undefined;
  /** The quickest that is exact enough. */
  readonly tracer: Tracer;
}

/** A design that was given. Whoever holds it can have its states made ready even after it was forgotten. */
export interface KnownDesign {
  readonly design: Design;
  /** Null: not worked out yet. */
  forging: Forging | null;
  /** By state and bar. */
  readonly states: Map<string, Ready>;
}

/** States that are kept ready: each holds memory of the kernel. */
const MOST_READY = 24;

/** The designs that were given, worked out and compiled when first asked for, and kept so. */
export class KnownDesigns {
  private readonly designs = new Map<number, KnownDesign>();
  /** What is ready; that asked for last comes last. */
  private readonly used = new Map<Ready, () => void>();
  private readonly exact = new WeakMap<Program, Tracer>();
  /** Undefined: not made yet. Null: this host has none. */
  private kernel: Kernel | null | undefined;

  add(key: number, design: Design): void {
    this.designs.set(key, { design, forging: null, states: new Map() });
  }

  remove(key: number): void {
    this.designs.delete(key);
  }

  /** @throws RangeError when the design was not given */
  get(key: number): KnownDesign {
    const known = this.designs.get(key);
    if (!known) throw new RangeError(`KnownDesigns.get: there is no design ${key}`);
    return known;
  }

  /** A state of a bar; the result as it is in the end when none is named. Null when a step before it is refused. */
  ready(known: KnownDesign, at?: Moment): Ready | null {
    const name = at ? `${at.state}/${at.bar}` : '';
    const ready = known.states.get(name) ?? this.prepared(known, at);
    if (ready === null) return null;
    known.states.set(name, ready);
    this.used.delete(ready);
    this.used.set(ready, () => known.states.delete(name));
    const [oldest] = this.used;
    if (this.used.size > MOST_READY && oldest) {
      const [gone, letGo] = oldest;
      this.used.delete(gone);
      letGo();
    }
    return ready;
  }

  /** A tracer in double precision, for a few points. */
  exactTracer({ program }: Ready): Tracer {
    const known = this.exact.get(program);
    if (known) return known;
    const tracer = referenceTracer(program);
    this.exact.set(program, tracer);
    return tracer;
  }

  private prepared(known: KnownDesign, at: Moment | undefined): Ready | null {
    known.forging ??= evaluate(known.design);
    const program = compile(known.forging, at);
    if (program === null) return null;
    if (this.kernel === undefined) this.kernel = kernelOf();
    return {
      program,
      steels: known.forging.steels,
      blank: known.design.blank,
      tracer: tracerFor(program, this.kernel),
    };
  }
}
