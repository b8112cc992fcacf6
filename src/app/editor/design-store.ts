import { Injectable, computed, inject, linkedSignal, signal } from '@angular/core';
import {
  type Bar,
  type Design,
  type History,
  STARTERS,
  aborted,
  barOf,
  canRedo,
  canUndo,
  edited,
  marked,
  redone,
  settled,
  startHistory,
  steelIdsOf,
  undone,
} from '@shared/design';
import { warningsOf } from '@shared/checks';
import { type ForgedBar, type Forging, evaluate } from '@shared/forging';
import { CATALOGUE, type Steel } from '@shared/steels';
import type { Step } from '@shared/steps';
import { UnitsStore } from '../core/units/units-store';
import type { GestureEnd } from './canvas/contract';
import { NO_LAYERS, type Selection, firstSelection, selectionWithin } from './selection';

/** What is selected, with what belongs to it. */
export interface Selected {
  readonly bar: Bar;
  readonly forged: ForgedBar;
  /** Null: the bar's start. */
  readonly step: Step | null;
  /** Place of the selected state among the bar's states: 0 is the start. */
  readonly place: number;
}

/**
 * The design that is open: document with undo, everything computed of it, and what is selected.
 *
 * Edits are pure functions of the document. Those that belong together (a drag, the key presses in one field) carry
 * one gesture and are one undo.
 */
@Injectable()
export class DesignStore {
  private readonly units = inject(UnitsStore);
  private readonly kept = signal<History<Design>>(
    startHistory((STARTERS[0] as (typeof STARTERS)[number]).design),
  );
  private readonly chosen = signal<Selection>(firstSelection(this.kept().present));
  /** The field or key whose run of edits is open; null for none, or for a gesture on the canvas. */
  private openRun: string | null = null;

  readonly history = this.kept.asReadonly();
  readonly design = computed(() => this.kept().present);
  readonly canUndo = computed(() => canUndo(this.kept()));
  readonly canRedo = computed(() => canRedo(this.kept()));

  /** The design with all that is computed of it; what an edit left alone is taken from the one before. */
  readonly forging = linkedSignal<Design, Forging>({
    source: this.design,
    computation: (design, before) => evaluate(design, before?.value),
  });
  readonly warnings = computed(() => warningsOf(this.forging(), this.units.format()));

  readonly selection = computed(() => selectionWithin(this.design(), this.chosen()));
  readonly selected = computed((): Selected => {
    const { barId, stepId } = this.selection();
    const bar = barOf(this.design(), barId);
    const forged = this.forging().bars.find((candidate) => candidate.id === barId) as ForgedBar;
    const at = bar.steps.findIndex((step) => step.id === stepId);
    return { bar, forged, step: bar.steps[at] ?? null, place: at + 1 };
  });

  /** Steels that can be laid: the design's own first, each once. */
  readonly steels = computed((): readonly Steel[] => {
    const own = this.design().steels ?? [];
    const ids = new Set(own.map((steel) => steel.id));
    return [...own, ...CATALOGUE.filter((steel) => !ids.has(steel.id))];
  });
  readonly steelTable = computed(
    (): ReadonlyMap<string, Steel> => new Map(this.steels().map((steel) => [steel.id, steel])),
  );
  /** Ids of the steels that are laid, in the order of the document. */
  readonly steelsLaid = computed(() => steelIdsOf(this.design()));

  /** Begins with a document, with its undo if that is known. */
  open(design: Design, history?: Pick<History<Design>, 'past' | 'future'> | null): void {
    this.openRun = null;
    this.kept.set({
      ...startHistory(design),
      ...(history && { past: history.past, future: history.future }),
    });
    this.chosen.set(firstSelection(design));
  }

  /**
   * Changes the document.
   * @param run edits that carry the same run, one right after the other, are undone together
   */
  edit(change: (design: Design) => Design, run: string | null = null): void {
    const changed = change(this.design());
    if (changed === this.design()) return;
    if (run === null || run !== this.openRun) this.closeRun();
    if (run !== null && this.openRun === null) {
      this.openRun = run;
      this.kept.update(marked);
    }
    this.kept.update((history) => edited(history, changed));
  }

  /** Ends a run of edits: what follows is undone by itself. */
  closeRun(): void {
    this.openRun = null;
    this.kept.update(settled);
  }

  /** Begins a gesture on the canvas. */
  beginGesture(): void {
    this.closeRun();
    this.kept.update(marked);
  }

  /** What the gesture makes so far of the document that it began from. */
  gesture(change: (design: Design) => Design): void {
    this.kept.update((history) => edited(history, change(history.mark?.present ?? history.present)));
  }

  endGesture(end: GestureEnd): void {
    this.kept.update(end === 'settle' ? settled : aborted);
  }

  undo(): void {
    this.closeRun();
    this.kept.update(undone);
  }

  redo(): void {
    this.closeRun();
    this.kept.update(redone);
  }

  select(barId: string, stepId: string | null): void {
    const { barId: bar, stepId: step } = this.chosen();
    if (bar !== barId || step !== stepId) this.chosen.set({ barId, stepId, layers: NO_LAYERS });
  }

  selectLayers(layers: ReadonlySet<number>): void {
    this.chosen.set({ ...this.selection(), stepId: null, layers });
  }
}
