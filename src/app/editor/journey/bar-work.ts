import { Injectable, inject } from '@angular/core';
import {
  type Assembly,
  type Bar,
  type Design,
  type Stack,
  addBar,
  barOf,
  canRemoveBar,
  duplicateBar,
  removeBar,
} from '@shared/design';
import { DesignStore } from '../design-store';
import { freeName } from '../document-edits';
import { newId } from '../new-id';
import { StepWork } from './step-work';

/** What is done to whole bars. */
@Injectable()
export class BarWork {
  private readonly store = inject(DesignStore);
  private readonly steps = inject(StepWork);

  /** A bar of one layer of what is laid already, to be built up; it goes before the result. */
  addStack(): void {
    const design = this.store.design();
    const [steel] = this.store.steelsLaid();
    const start: Stack = {
      kind: 'stack',
      lengthMm: 150,
      widthMm: 30,
      layers: [{ steel: steel ?? '1084', thicknessMm: 5 }],
    };
    this.add(design, { id: newId(), name: freeName(design, 'Bar'), start, steps: [] }, false);
  }

  /** Puts the result together with itself: a bar of two pieces of it, which is the result from now on. */
  addAssembly(along: Assembly['along']): void {
    const design = this.store.design();
    const free = design.bars.filter((bar) => bar.id === design.result || canRemoveBar(design, bar.id));
    const pieces =
      free.length > 1
        ? free.map((bar) => ({ bar: bar.id }))
        : [{ bar: design.result }, { bar: design.result }];
    const bar: Bar = {
      id: newId(),
      name: freeName(design, 'Billet'),
      start: { kind: 'assembly', along, pieces },
      steps: [],
    };
    this.add(design, bar, true);
  }

  duplicate(barId: string): void {
    const ids = new Set(this.store.design().bars.map((bar) => bar.id));
    this.store.edit((design) => duplicateBar(design, barId, newId));
    const copy = this.store.design().bars.find((bar) => !ids.has(bar.id));
    if (copy) this.store.select(copy.id, null);
  }

  canRemove(barId: string): boolean {
    return canRemoveBar(this.store.design(), barId);
  }

  remove(barId: string): void {
    const { name } = barOf(this.store.design(), barId);
    if (!this.canRemove(barId)) return;
    this.store.edit((design) => removeBar(design, barId));
    this.steps.removed(`${name} removed`);
  }

  private add(design: Design, bar: Bar, isResult: boolean): void {
    this.store.edit(() => addBar(design, bar, isResult));
    this.store.select(bar.id, null);
  }
}
