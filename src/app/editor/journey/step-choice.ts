import { ChangeDetectionStrategy, Component, ViewEncapsulation, output, viewChild } from '@angular/core';
import { MatMenu, MatMenuContent, MatMenuItem } from '@angular/material/menu';
import { STEP_KINDS, STEP_KIND_NAMES, type StepKindName } from '@shared/steps';

/** The menu of all kinds of steps, each with what it is for. `menu` goes into a menu trigger. */
@Component({
  selector: 'lw-step-choice',
  imports: [MatMenu, MatMenuContent, MatMenuItem],
  templateUrl: './step-choice.html',
  styleUrl: './step-choice.scss',
  // The menu opens outside of this component's element.
  encapsulation: ViewEncapsulation.None,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepChoice {
  readonly menu = viewChild.required(MatMenu);
  /** The kind, with the data of the trigger that the menu was opened from. */
  readonly chosen = output<{ readonly kind: StepKindName; readonly at: number }>();

  protected readonly kinds = STEP_KIND_NAMES.map((kind) => ({ kind, words: STEP_KINDS[kind].words }));
}
