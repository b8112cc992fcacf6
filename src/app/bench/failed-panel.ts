import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';

/** Says what could not be had, and offers to try again. */
@Component({
  selector: 'lw-failed-panel',
  imports: [MatButton, MatIcon],
  template: `
    <div role="alert">
      <mat-icon svgIcon="warning" />
      <div>
        <p>
          <strong>{{ title() }}</strong>
        </p>
        <p>{{ text() }}</p>
      </div>
      <button type="button" mat-stroked-button (click)="again.emit()">Try again</button>
    </div>
  `,
  styles: `
    div[role='alert'] {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 12px 16px;
      padding: 16px;
      background: var(--lw-straw-ground);
      border: 1px solid var(--lw-edge);
      border-radius: 4px;

      > div {
        flex: 1 1 240px;
      }
    }
    mat-icon {
      color: var(--lw-straw);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FailedPanel {
  readonly title = input.required<string>();
  readonly text = input.required<string>();
  readonly again = output();
}
