import type { Assembly, Bar, Design, Piece, Stack } from '../schema.js';

/** The bar with an id. @throws RangeError when the design has none */
export function barOf(design: Design, barId: string): Bar {
  const bar = design.bars.find((candidate) => candidate.id === barId);
  if (bar === undefined) throw new RangeError(`barOf: the design has no bar "${barId}"`);
  return bar;
}

/** The design with one bar changed; the same design when the change gives the same bar. */
export function withBar(design: Design, barId: string, change: (bar: Bar) => Bar): Design {
  const bar = barOf(design, barId);
  const next = change(bar);
  return next === bar
    ? design
    : { ...design, bars: design.bars.map((candidate) => (candidate.id === barId ? next : candidate)) };
}

/** The design with a bar's stack changed. @throws RangeError when the bar starts as an assembly */
export function withStack(design: Design, barId: string, change: (stack: Stack) => Stack): Design {
  return withBar(design, barId, (bar) => {
    if (bar.start.kind !== 'stack') throw new RangeError(`withStack: bar "${barId}" starts as an assembly`);
    const start = change(bar.start);
    return start === bar.start ? bar : { ...bar, start };
  });
}

/** The design with a bar's assembly changed. @throws RangeError when the bar starts as a stack */
export function withAssembly(
  design: Design,
  barId: string,
  change: (assembly: Assembly) => Assembly,
): Design {
  return withBar(design, barId, (bar) => {
    if (bar.start.kind !== 'assembly') throw new RangeError(`withAssembly: bar "${barId}" starts as a stack`);
    const start = change(bar.start);
    return start === bar.start ? bar : { ...bar, start };
  });
}

/** Adds a bar before the bar that is the result, or at the end when `asResult`. */
export function addBar(design: Design, bar: Bar, asResult: boolean): Design {
  if (asResult) return { ...design, bars: [...design.bars, bar], result: bar.id };
  const at = design.bars.findIndex((candidate) => candidate.id === design.result);
  return { ...design, bars: [...design.bars.slice(0, at), bar, ...design.bars.slice(at)] };
}

/** Whether a bar can go: it is not the result and no piece is of it. */
export function canRemoveBar(design: Design, barId: string): boolean {
  return barId !== design.result && !usersOf(design, barId).length;
}

/** The bars that a bar is laid into. */
export function usersOf(design: Design, barId: string): readonly Bar[] {
  return design.bars.filter(
    (bar) => bar.start.kind === 'assembly' && bar.start.pieces.some((piece) => piece.bar === barId),
  );
}

/** Removes a bar that nothing uses; any other design is given back as it is. */
export function removeBar(design: Design, barId: string): Design {
  if (!canRemoveBar(design, barId)) return design;
  return { ...design, bars: design.bars.filter((bar) => bar.id !== barId) };
}

export function renameBar(design: Design, barId: string, name: string): Design {
  return withBar(design, barId, (bar) => (bar.name === name ? bar : { ...bar, name }));
}

/** A copy of a bar, put right behind it. `ids` gives a new id for the bar and each of its steps. */
export function duplicateBar(design: Design, barId: string, newId: () => string): Design {
  const at = design.bars.findIndex((bar) => bar.id === barId);
  const bar = barOf(design, barId);
  const copy = {
    ...bar,
    id: newId(),
    name: `${bar.name} (copy)`,
    steps: bar.steps.map((step) => ({ ...step, id: newId() })),
  };
  return { ...design, bars: [...design.bars.slice(0, at + 1), copy, ...design.bars.slice(at + 1)] };
}

/** Changes the pieces of an assembly. */
export function setPieces(design: Design, barId: string, pieces: readonly Piece[]): Design {
  return withAssembly(design, barId, (assembly) => ({ ...assembly, pieces }));
}
