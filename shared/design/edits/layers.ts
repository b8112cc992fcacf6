import type { Design, Layer, Stack } from '../schema.js';
import { withStack } from './bars.js';

/** Puts layers into a stack so that the first of them gets the place `at` (0: the bottom). */
export function insertLayers(design: Design, barId: string, at: number, layers: readonly Layer[]): Design {
  if (layers.length === 0) return design;
  return changeLayers(design, barId, (old) => [...old.slice(0, at), ...layers, ...old.slice(at)]);
}

/** Takes layers out; the last one stays, since a stack has at least one. */
export function removeLayers(design: Design, barId: string, places: ReadonlySet<number>): Design {
  return changeLayers(design, barId, (old) => {
    const rest = old.filter((_, place) => !places.has(place));
    return rest.length === 0 ? old.slice(0, 1) : rest;
  });
}

/**
 * Moves layers, kept in their order, to before the layer that is at `to` now (`to` = number of layers: to the top).
 */
export function moveLayers(design: Design, barId: string, places: ReadonlySet<number>, to: number): Design {
  return changeLayers(design, barId, (old) => {
    const moved = old.filter((_, place) => places.has(place));
    const below = old.filter((_, place) => !places.has(place) && place < to);
    const above = old.filter((_, place) => !places.has(place) && place >= to);
    const next = [...below, ...moved, ...above];
    return next.every((layer, place) => layer === old[place]) ? old : next;
  });
}

/** Sets the thickness of layers, mm. */
export function setThickness(
  design: Design,
  barId: string,
  places: ReadonlySet<number>,
  thicknessMm: number,
): Design {
  return changeEach(design, barId, places, (layer) =>
    layer.thicknessMm === thicknessMm ? layer : { ...layer, thicknessMm },
  );
}

/** Sets the steel of layers. */
export function setSteel(design: Design, barId: string, places: ReadonlySet<number>, steel: string): Design {
  return changeEach(design, barId, places, (layer) => (layer.steel === steel ? layer : { ...layer, steel }));
}

/** Replaces a steel by another in every stack of the design. */
export function swapSteel(design: Design, from: string, to: string): Design {
  return design.bars.reduce(
    (next, bar) =>
      bar.start.kind !== 'stack'
        ? next
        : changeLayers(next, bar.id, (layers) =>
            layers.some((layer) => layer.steel === from)
              ? layers.map((layer) => (layer.steel === from ? { ...layer, steel: to } : layer))
              : layers,
          ),
    design,
  );
}

/** Splits a layer into `parts` equal ones. */
export function splitLayer(design: Design, barId: string, place: number, parts: number): Design {
  return changeLayers(design, barId, (old) =>
    old.flatMap((layer, at) =>
      at === place
        ? Array.from({ length: parts }, () => ({ ...layer, thicknessMm: layer.thicknessMm / parts }))
        : [layer],
    ),
  );
}

/** Copies layers and puts the copies on top of the uppermost of them. */
export function duplicateLayers(design: Design, barId: string, places: ReadonlySet<number>): Design {
  return changeLayers(design, barId, (old) => {
    const copies = old.filter((_, place) => places.has(place));
    const top = Math.max(...places) + 1;
    return [...old.slice(0, top), ...copies, ...old.slice(top)];
  });
}

/** Turns the whole stack, or a run of it, upside down. */
export function mirrorLayers(design: Design, barId: string, from = 0, to = Infinity): Design {
  return changeLayers(design, barId, (old) => [
    ...old.slice(0, from),
    ...old.slice(from, to).reverse(),
    ...old.slice(Math.min(to, old.length)),
  ]);
}

/**
 * A group of layers laid `times` over; with `endOnFirst` the first of the group closes it, so "1084 then 15N20, 7
 * times, end on 1084" gives 15.
 */
export function repeatedGroup(group: readonly Layer[], times: number, endOnFirst: boolean): readonly Layer[] {
  const layers = Array.from({ length: times }, () => group).flat();
  return endOnFirst && group[0] ? [...layers, group[0]] : layers;
}

/** Sets the ratio of the thicknesses of two steels (first to second) in a stack, its height kept. */
export function setThicknessRatio(
  design: Design,
  barId: string,
  firstSteel: string,
  secondSteel: string,
  ratio: number,
): Design {
  return changeLayers(design, barId, (old) => {
    const sum = (steel: string): number =>
      old.reduce((total, layer) => total + (layer.steel === steel ? layer.thicknessMm : 0), 0);
    const first = sum(firstSteel);
    const second = sum(secondSteel);
    if (first === 0 || second === 0) return old;
    const counts = (steel: string): number => old.filter((layer) => layer.steel === steel).length;
    const unit = (first + second) / (ratio * counts(firstSteel) + counts(secondSteel));
    return old.map((layer) => {
      if (layer.steel === firstSteel) return { ...layer, thicknessMm: ratio * unit };
      return layer.steel === secondSteel ? { ...layer, thicknessMm: unit } : layer;
    });
  });
}

/** Length and width of a stack, mm. */
export function setStackSize(
  design: Design,
  barId: string,
  size: { lengthMm?: number; widthMm?: number },
): Design {
  return withStack(design, barId, (stack) => {
    const { lengthMm = stack.lengthMm, widthMm = stack.widthMm } = size;
    const isSame = lengthMm === stack.lengthMm && widthMm === stack.widthMm;
    return isSame ? stack : { ...stack, lengthMm, widthMm };
  });
}

/** Replaces a stack's layers. */
export function setLayers(design: Design, barId: string, layers: readonly Layer[]): Design {
  return changeLayers(design, barId, () => layers);
}

function changeLayers(
  design: Design,
  barId: string,
  change: (layers: Stack['layers']) => readonly Layer[],
): Design {
  return withStack(design, barId, (stack) => {
    const layers = change(stack.layers);
    return layers === stack.layers ? stack : { ...stack, layers };
  });
}

function changeEach(
  design: Design,
  barId: string,
  places: ReadonlySet<number>,
  change: (layer: Layer) => Layer,
): Design {
  return changeLayers(design, barId, (old) => {
    const next = old.map((layer, place) => (places.has(place) ? change(layer) : layer));
    return next.every((layer, place) => layer === old[place]) ? old : next;
  });
}
