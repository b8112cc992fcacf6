import { Injectable, inject } from '@angular/core';
import { LiveAnnouncer } from '@angular/cdk/a11y';
import { MatSnackBar } from '@angular/material/snack-bar';
import {
  barOf,
  copySteps,
  duplicateStep,
  insertStep,
  moveStep,
  removeStep,
  toggleStep,
} from '@shared/design';
import { STEP_KINDS, type Step, type StepKindName, kindOf } from '@shared/steps';
import { DesignStore } from '../design-store';
import { newId } from '../new-id';

/** What is done to the steps of the design, whichever way it was asked for: by drag, by key, by button. */
@Injectable()
export class StepWork {
  private readonly store = inject(DesignStore);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly snackBar = inject(MatSnackBar);

  /** Puts in a step that makes sense for the bar at that place, and selects it. */
  insert(barId: string, at: number, kind: StepKindName): void {
    const forged = this.store.forging().bars.find((bar) => bar.id === barId);
    const before = forged?.states[Math.min(at, forged.states.length - 1)];
    // A bar whose pieces don't go together has no state to propose from; the last one that was computed will do.
    const bar =
      before?.bar ??
      this.store
        .forging()
        .bars.flatMap((other) => other.states)
        .at(-1)?.bar;
    if (bar === undefined) return;
    const id = newId();
    const step = { ...STEP_KINDS[kind].propose(bar), id } as Step;
    this.store.edit((design) => insertStep(design, barId, at, step));
    this.store.select(barId, id);
    this.say(`${kindOf(step).words.name} added as step ${at + 1}`);
  }

  /** @param to place of the step, counted without it */
  move(barId: string, stepId: string, to: number): void {
    const { steps } = barOf(this.store.design(), barId);
    const step = steps.find((candidate) => candidate.id === stepId);
    if (step === undefined || to < 0 || to >= steps.length) return;
    this.store.edit((design) => moveStep(design, barId, stepId, to));
    this.store.select(barId, stepId);
    this.say(`${kindOf(step).words.name} is step ${to + 1} of ${steps.length} now`);
  }

  moveBy(barId: string, stepId: string, by: 1 | -1): void {
    const at = barOf(this.store.design(), barId).steps.findIndex((step) => step.id === stepId);
    this.move(barId, stepId, at + by);
  }

  duplicate(barId: string, stepId: string): void {
    const id = newId();
    this.store.edit((design) => duplicateStep(design, barId, stepId, id));
    this.store.select(barId, id);
    this.say('Duplicated');
  }

  toggle(barId: string, stepId: string): void {
    this.store.edit((design) => toggleStep(design, barId, stepId));
    const step = barOf(this.store.design(), barId).steps.find((candidate) => candidate.id === stepId);
    this.say(step?.isOff ? 'Switched off' : 'Switched on');
  }

  /** Takes a step out; the one that was behind it is selected. Undo is offered, no question asked. */
  remove(barId: string, stepId: string): void {
    const { steps } = barOf(this.store.design(), barId);
    const at = steps.findIndex((step) => step.id === stepId);
    const step = steps[at];
    if (step === undefined) return;
    this.store.edit((design) => removeStep(design, barId, stepId));
    this.store.select(barId, (steps[at + 1] ?? steps[at - 1])?.id ?? null);
    this.removed(`${kindOf(step).words.name} removed`);
  }

  /** Copies steps, from the one at `from` on up to `to` (not included), to the end of another bar. */
  copyTo(fromBarId: string, from: number, to: number, toBarId: string): void {
    this.store.edit((design) => copySteps(design, fromBarId, from, to, toBarId, newId));
    const { name, steps } = barOf(this.store.design(), toBarId);
    const first = steps[steps.length - (to - from)];
    this.store.select(toBarId, first?.id ?? null);
    this.say(`${to - from} ${to - from === 1 ? 'step' : 'steps'} copied to ${name}`);
  }

  /** Says that something went, with a way to have it back. */
  removed(words: string): void {
    const { present } = this.store.history();
    const offer = this.snackBar.open(words, 'Undo', { duration: 8000 });
    offer.onAction().subscribe(() => {
      // Only what was said: not whatever was done since.
      if (this.store.design() === present) this.store.undo();
    });
  }

  private say(words: string): void {
    void this.announcer.announce(words);
  }
}
