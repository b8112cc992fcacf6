import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal } from '@angular/core';
import { insertLayers, moveLayers, setThickness } from '@shared/design';
import { kindOf } from '@shared/steps';
import { UnitsStore } from '../../core/units/units-store';
import { AssemblyCanvas } from '../canvas/assembly-canvas';
import { BarCanvas } from '../canvas/bar-canvas';
import type { AssemblyGesture, GestureEnd, StackGesture } from '../canvas/contract';
import { StackCanvas } from '../canvas/stack-canvas';
import { DesignStore } from '../design-store';
import { editPiece, insertPiece, layerLike, movePiece, setAlong, setUnevenness } from '../document-edits';
import { PatternView } from '../pattern/pattern-view';
import { placesAfterMove } from '../twin/layer-work';
import { stockThicknessesMm } from './stock-thicknesses';

/**
 * The drawing of what is selected: the stack to be worked on, or the bar as it is after a step. What is done on it
 * becomes edits of the document, one gesture one undo.
 */
@Component({
  selector: 'lw-drawing',
  imports: [AssemblyCanvas, BarCanvas, PatternView, StackCanvas],
  templateUrl: './drawing.html',
  styleUrl: './drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Drawing {
  protected readonly store = inject(DesignStore);
  protected readonly units = inject(UnitsStore);

  /** The stack, while a stack's start is selected. */
  protected readonly stack = computed(() => {
    const { bar, step } = this.store.selected();
    return step === null && bar.start.kind === 'stack' ? bar.start : null;
  });
  /** The state to draw: what is selected, or the last one before a step that can't be done. */
  protected readonly shown = computed(() => {
    const { bar, forged, place } = this.store.selected();
    const at = Math.min(place, forged.states.length - 1);
    const state = forged.states[at];
    if (state === undefined) return null;
    const isEnd = forged.refusal === null && at === forged.states.length - 1;
    return {
      state,
      moment: { bar: bar.id, state: at },
      words: state.step ? `after ${kindOf(state.step).words.name}` : 'as it is put together',
      isResult: isEnd && bar.id === this.store.design().result,
      isBefore: place > at,
    };
  });
  /** The assembly, while its start is selected. */
  protected readonly assembly = computed(() => {
    const { bar, step } = this.store.selected();
    return step === null && bar.start.kind === 'assembly' ? bar.start : null;
  });
  protected readonly barNames = computed(
    () => new Map(this.store.design().bars.map((bar) => [bar.id, bar.name])),
  );
  /** Place of the chosen piece; another bar has none yet. */
  protected readonly piece = linkedSignal<string, number | null>({
    source: () => this.store.selection().barId,
    computation: () => null,
  });
  protected readonly stockMm = computed(() => stockThicknessesMm(this.units.system()));

  private layersBefore: ReadonlySet<number> = new Set();
  private pieceBefore: number | null = null;

  protected begin(): void {
    this.layersBefore = this.store.selection().layers;
    this.pieceBefore = this.piece();
    this.store.beginGesture();
  }

  protected stackGesture(gesture: StackGesture): void {
    const { barId } = this.store.selection();
    switch (gesture.kind) {
      case 'move':
        this.store.gesture((design) => moveLayers(design, barId, gesture.places, gesture.to));
        this.store.selectLayers(placesAfterMove(gesture.places, gesture.to));
        break;
      case 'thickness':
        this.store.gesture((design) =>
          setThickness(design, barId, new Set([gesture.place]), gesture.thicknessMm),
        );
        break;
      case 'insert':
        this.store.gesture((design) => {
          const start = design.bars.find((bar) => bar.id === barId)?.start;
          const layers = start?.kind === 'stack' ? start.layers : [];
          return insertLayers(design, barId, gesture.at, [layerLike(layers, gesture.at, gesture.steel)]);
        });
        this.store.selectLayers(new Set([gesture.at]));
        break;
    }
  }

  protected assemblyGesture(gesture: AssemblyGesture): void {
    const { barId } = this.store.selection();
    if (gesture.kind === 'move') {
      this.piece.set(gesture.to > gesture.place ? gesture.to - 1 : gesture.to);
    } else if (gesture.kind === 'insert') this.piece.set(gesture.at);
    this.store.gesture((design) => {
      switch (gesture.kind) {
        case 'move':
          return movePiece(design, barId, gesture.place, gesture.to);
        case 'turn':
          return editPiece(design, barId, gesture.place, { quarterTurns: gesture.quarterTurns });
        case 'end-for-end':
          return editPiece(design, barId, gesture.place, { endForEnd: gesture.endForEnd });
        case 'insert':
          return insertPiece(design, barId, gesture.at, { bar: gesture.bar });
        case 'along':
          return setAlong(design, barId, gesture.along);
      }
    });
  }

  protected end(how: GestureEnd): void {
    this.store.endGesture(how);
    if (how === 'settle') return;
    if (this.stack() !== null) this.store.selectLayers(this.layersBefore);
    this.piece.set(this.pieceBefore);
  }

  protected setUnevenness(unevenness: number): void {
    this.store.edit((design) => setUnevenness(design, unevenness), 'unevenness');
  }
}
