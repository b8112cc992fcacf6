import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { Warning, WarningSeverity } from '@shared/checks';

const SEVERITY_WORDS: Readonly<Record<WarningSeverity, string>> = {
  stop: 'Stop',
  caution: 'Caution',
  note: 'Note',
};

/** Warnings, each with how grave it is, what is wrong and why, what to do, and where the rule comes from. */
@Component({
  selector: 'lw-warning-list',
  templateUrl: './warning-list.html',
  styleUrl: './warning-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WarningList {
  /** Shown in their order. */
  readonly warnings = input.required<readonly Warning[]>();
  /** Says where a warning belongs; with it, each gets a button that leads there. */
  readonly placeWords = input<(warning: Warning) => string>();

  /** The reader wants to see the place of this warning. */
  readonly placeOpen = output<Warning>();

  protected readonly severityWords = SEVERITY_WORDS;
}
