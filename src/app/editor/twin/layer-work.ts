import { Injectable, inject } from '@angular/core';
import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  MAX_LAYERS,
  type Stack,
  duplicateLayers,
  insertLayers,
  mirrorLayers,
  moveLayers,
  removeLayers,
  setSteel,
  setThickness,
  splitLayer,
} from '@shared/design';
import { DesignStore } from '../design-store';
import { layerLike } from '../document-edits';
import { StepWork } from '../journey/step-work';

/** What is done to the layers of the selected stack, whichever way it was asked for. */
@Injectable()
export class LayerWork {
  private readonly store = inject(DesignStore);
  private readonly steps = inject(StepWork);
  private readonly announcer = inject(LiveAnnouncer);

  /** Lays a layer so that it gets the place `at`, as thick as its like, and selects it. */
  insert(at: number, steel: string): void {
    const { layers } = this.stack();
    if (!this.hasRoom(1)) return;
    this.store.edit((design) => insertLayers(design, this.barId(), at, [layerLike(layers, at, steel)]));
    this.store.selectLayers(new Set([at]));
    this.say(`Layer laid in as ${at + 1} of ${layers.length + 1}`);
  }

  /** Copies the layers and puts the copies on top of the uppermost of them; the copies are selected. */
  duplicate(places: ReadonlySet<number>): void {
    if (places.size === 0 || !this.hasRoom(places.size)) return;
    this.store.edit((design) => duplicateLayers(design, this.barId(), places));
    const top = Math.max(...places) + 1;
    this.store.selectLayers(new Set([...places].map((_, i) => top + i)));
    this.say(`${count(places.size)} duplicated`);
  }

  remove(places: ReadonlySet<number>): void {
    const { layers } = this.stack();
    if (places.size === 0) return;
    if (layers.length === 1) {
      this.say('A stack keeps at least one layer');
      return;
    }
    const lowest = Math.min(...places);
    this.store.edit((design) => removeLayers(design, this.barId(), places));
    const left = this.stack().layers.length;
    this.store.selectLayers(new Set([Math.min(lowest, left - 1)]));
    this.steps.removed(`${count(places.size)} removed`);
  }

  /** Moves the layers, kept in their order, up (+1) or down (−1) by one. */
  moveBy(places: ReadonlySet<number>, by: 1 | -1): void {
    const last = this.stack().layers.length - 1;
    const lowest = Math.min(...places);
    const highest = Math.max(...places);
    if (places.size === 0 || (by === 1 ? highest >= last : lowest <= 0)) return;
    // Up: to before the layer two above the highest, since places are counted before the move.
    this.move(places, by === 1 ? highest + 2 : lowest - 1);
  }

  /** Moves the layers to before the one that is at `to` now, and selects them there. */
  move(places: ReadonlySet<number>, to: number): void {
    this.store.edit((design) => moveLayers(design, this.barId(), places, to));
    this.store.selectLayers(placesAfterMove(places, to));
    const lowest = Math.min(...this.store.selection().layers);
    this.say(`${count(places.size)} moved to ${lowest + 1} from the bottom`);
  }

  setThickness(places: ReadonlySet<number>, thicknessMm: number): void {
    const run = `thickness.${[...places].join()}`;
    this.store.edit((design) => setThickness(design, this.barId(), places, thicknessMm), run);
  }

  setSteel(places: ReadonlySet<number>, steel: string): void {
    this.store.edit((design) => setSteel(design, this.barId(), places, steel));
  }

  /** Splits each of the layers into two. */
  split(places: ReadonlySet<number>): void {
    if (places.size === 0 || !this.hasRoom(places.size)) return;
    const fromTheTop = [...places].sort((a, b) => b - a);
    this.store.edit((design) =>
      fromTheTop.reduce((next, place) => splitLayer(next, this.barId(), place, 2), design),
    );
    this.store.selectLayers(new Set());
    this.say(`${count(places.size)} split in two`);
  }

  /** Turns the whole stack upside down; with two or more layers selected, what lies from the lowest to the highest of them. */
  mirror(places: ReadonlySet<number>): void {
    const isRun = places.size > 1;
    const from = isRun ? Math.min(...places) : 0;
    const to = isRun ? Math.max(...places) + 1 : Infinity;
    this.store.edit((design) => mirrorLayers(design, this.barId(), from, to));
    this.say('Turned upside down');
  }

  selectAll(): void {
    this.store.selectLayers(new Set(this.stack().layers.keys()));
  }

  private barId(): string {
    return this.store.selection().barId;
  }

  private stack(): Stack {
    return this.store.selected().bar.start as Stack;
  }

  private hasRoom(more: number): boolean {
    if (this.stack().layers.length + more <= MAX_LAYERS) return true;
    this.say(`A stack holds ${MAX_LAYERS} layers at most`);
    return false;
  }

  private say(words: string): void {
    void this.announcer.announce(words);
  }
}

/** Where layers lie after a move to before the layer that was at `to`. */
export function placesAfterMove(places: ReadonlySet<number>, to: number): ReadonlySet<number> {
  const first = to - [...places].filter((place) => place < to).length;
  return new Set([...places].map((_, i) => first + i));
}

function count(layers: number): string {
  return `${layers} ${layers === 1 ? 'layer' : 'layers'}`;
}
