import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { insertLayers, moveLayers, setThickness } from '@shared/design';
import { kindOf } from '@shared/steps';
import { UnitsStore } from '../../core/units/units-store';
import { BarCanvas } from '../canvas/bar-canvas';
import type { AssemblyGesture, GestureEnd, StackGesture } from '../canvas/contract';
import { StackCanvas } from '../canvas/stack-canvas';
import { DesignStore } from '../design-store';
import { editPiece, insertPiece, layerLike, movePiece, setAlong } from '../document-edits';
import { placesAfterMove } from '../twin/layer-work';
import { stockThicknessesMm } from './stock-thicknesses';

/**
 * The drawing of what is selected: the stack to be worked on, or the bar as it is after a step. What is done on it
 * becomes edits of the document, one gesture one undo.
 */
@Component({
  selector: 'lw-drawing',
  imports: [BarCanvas, StackCanvas],
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
  protected readonly state = computed(() => {
    const { forged, place } = this.store.selected();
    return forged.states[Math.min(place, forged.states.length - 1)] ?? null;
  });
  protected readonly isBefore = computed(() => {
    const { forged, place } = this.store.selected();
    return place >= forged.states.length;
  });
  protected readonly stateName = computed(() => {
    const step = this.state()?.step;
    return step ? kindOf(step).words.name : 'the start';
  });
  /** The assembly, while its start is selected. */
  protected readonly assembly = computed(() => {
    const { bar, step } = this.store.selected();
    return step === null && bar.start.kind === 'assembly' ? bar.start : null;
  });
  protected readonly stockMm = computed(() => stockThicknessesMm(this.units.system()));

  private layersBefore: ReadonlySet<number> = new Set();

  protected begin(): void {
    this.layersBefore = this.store.selection().layers;
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
    if (how === 'abort') this.store.selectLayers(this.layersBefore);
  }
}
