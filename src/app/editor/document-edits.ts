import type { Allowances } from '@shared/steps';
import {
  type Assembly,
  type Bar,
  type Design,
  type Layer,
  type Piece,
  type ShopLimits,
  setPieces,
  withAssembly,
} from '@shared/design';

/** Edits of the document that the editor alone makes; those that are trade live in `@shared/design`. */

/** The note of the design; an empty one is none. */
export function setNote(design: Design, note: string): Design {
  if ((design.note ?? '') === note) return design;
  const { note: _, ...rest } = design;
  return note === '' ? rest : { ...rest, note };
}

/** Makes a bar the billet; it may be any. */
export function setResult(design: Design, barId: string): Design {
  return design.result === barId ? design : { ...design, result: barId };
}

/** Sets one planning figure of the design, or gives it back to its default. */
export function setAllowance(design: Design, name: keyof Allowances, value: number | undefined): Design {
  const { allowances, ...rest } = design;
  const next = withValue(allowances, name, value);
  return next === undefined ? rest : { ...rest, allowances: next };
}

/** Sets one limit of the shop's machines for this design, or gives it back to its default. */
export function setLimit(design: Design, name: keyof ShopLimits, value: number | undefined): Design {
  const { limits, ...rest } = design;
  const next = withValue(limits, name, value);
  return next === undefined ? rest : { ...rest, limits: next };
}

/** How uneven the hammer leaves the layers, 0–1; an even bar needs no word. */
export function setUnevenness(design: Design, unevenness: number): Design {
  if ((design.unevenness ?? 0) === unevenness) return design;
  const { unevenness: _, ...rest } = design;
  return unevenness === 0 ? rest : { ...rest, unevenness };
}

/** Which way the pieces of an assembly are put together. */
export function setAlong(design: Design, barId: string, along: Assembly['along']): Design {
  return withAssembly(design, barId, (assembly) =>
    assembly.along === along ? assembly : { ...assembly, along },
  );
}

/** Changes one piece of an assembly. What is usual (no turn, not end for end) is left out of the document. */
export function editPiece(design: Design, barId: string, place: number, change: Partial<Piece>): Design {
  return withPieces(design, barId, (pieces) =>
    pieces.map((piece, at) => {
      if (at !== place) return piece;
      const { bar, quarterTurns, endForEnd } = { ...piece, ...change };
      return { bar, ...(quarterTurns && { quarterTurns }), ...(endForEnd && { endForEnd }) };
    }),
  );
}

/** Lays a piece of a bar into an assembly so that it gets the place `at`. */
export function insertPiece(design: Design, barId: string, at: number, piece: Piece): Design {
  return withPieces(design, barId, (pieces) => [...pieces.slice(0, at), piece, ...pieces.slice(at)]);
}

/** Takes a piece out; two stay, since an assembly has at least two. */
export function removePiece(design: Design, barId: string, place: number): Design {
  return withPieces(design, barId, (pieces) =>
    pieces.length <= 2 ? pieces : pieces.filter((_, at) => at !== place),
  );
}

/** Moves a piece to before the one that is at `to` now; `to` = number of pieces: to the end. */
export function movePiece(design: Design, barId: string, place: number, to: number): Design {
  return withPieces(design, barId, (pieces) => {
    const moved = pieces[place];
    if (moved === undefined || to === place || to === place + 1) return pieces;
    const before = pieces.filter((_, at) => at !== place && at < to);
    const behind = pieces.filter((_, at) => at !== place && at >= to);
    return [...before, moved, ...behind];
  });
}

/** Makes the name of a bar that no bar has yet: "Bar", "Bar 2". */
export function freeName(design: Design, name: string): string {
  const taken = new Set(design.bars.map((bar: Bar) => bar.name));
  if (!taken.has(name)) return name;
  let number = 2;
  while (taken.has(`${name} ${number}`)) number += 1;
  return `${name} ${number}`;
}

/** The layer that goes well onto a stack at a place: as thick as its neighbours of that steel, else as the one below. */
export function layerLike(layers: readonly Layer[], at: number, steel: string): Layer {
  const like =
    [...layers.slice(0, at)].reverse().find((layer) => layer.steel === steel) ??
    layers.slice(at).find((layer) => layer.steel === steel) ??
    layers[at - 1] ??
    layers[at];
  return { steel, thicknessMm: like?.thicknessMm ?? 3 };
}

function withPieces(
  design: Design,
  barId: string,
  change: (pieces: readonly Piece[]) => readonly Piece[],
): Design {
  const start = design.bars.find((bar) => bar.id === barId)?.start;
  if (start?.kind !== 'assembly') return design;
  const pieces = change(start.pieces);
  return pieces === start.pieces ? design : setPieces(design, barId, pieces);
}

function withValue<T extends object>(
  values: Partial<T> | undefined,
  name: keyof T,
  value: number | undefined,
): Partial<T> | undefined {
  const { [name]: _, ...others } = values ?? {};
  const next = value === undefined ? others : { ...others, [name]: value };
  return Object.keys(next).length === 0 ? undefined : next;
}
