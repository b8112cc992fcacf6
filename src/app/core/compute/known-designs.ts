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

/** States that are kept ready: each holds memory of the kernel. */
const MOST_READY = 24;

/** The designs that were given, worked out and compiled when first asked for, and kept so. */
export class KnownDesigns {
  private readonly designs = new Map<number, { readonly design: Design; forging: Forging | null }>();
  /** By design, bar and state; the one asked for last comes last. */
  private readonly states = new Map<string, Ready>();
  private readonly exact = new WeakMap<Program, Tracer>();
  /** Undefined: not made yet. Null: this host has none. */
  private kernel: Kernel | null | undefined;
  /** Programs compiled so far. */
  compiled = 0;

  add(key: number, design: Design): void {
    this.designs.set(key, { design, forging: null });
  }

  remove(key: number): void {
    this.designs.delete(key);
    for (const state of [...this.states.keys()]) if (state.startsWith(`${key}/`)) this.states.delete(state);
  }

  /**
   * A state of a bar; the result as it is in the end when none is named. Null when a step before it is refused.
   * @throws RangeError when the design was not given
   */
  ready(key: number, at?: Moment): Ready | null {
    const name = `${key}/${at ? `${at.state}/${at.bar}` : ''}`;
    const known = this.states.get(name);
    this.states.delete(name);
    const ready = known ?? this.prepared(key, at);
    if (ready === null) return null;
    this.states.set(name, ready);
    const [oldest] = this.states.keys();
    if (this.states.size > MOST_READY && oldest !== undefined) this.states.delete(oldest);
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

  private prepared(key: number, at: Moment | undefined): Ready | null {
    const known = this.designs.get(key);
    if (!known) throw new RangeError(`KnownDesigns.ready: there is no design ${key}`);
    known.forging ??= evaluate(known.design);
    const program = compile(known.forging, at);
    if (program === null) return null;
    this.compiled += 1;
    if (this.kernel === undefined) this.kernel = kernelOf();
    return {
      program,
      steels: known.forging.steels,
      blank: known.design.blank,
      tracer: tracerFor(program, this.kernel),
    };
  }
}
