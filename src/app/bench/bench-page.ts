import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { SessionStore } from '../core/session/session-store';
import { DesignList } from './design-list';
import { FailedPanel } from './failed-panel';
import { KeptList } from './kept-list';
import { Welcome } from './welcome';

/** The first page: a member's designs; for everyone else what this is, and a way to begin at once. */
@Component({
  selector: 'lw-bench-page',
  imports: [DesignList, FailedPanel, KeptList, Welcome],
  template: `
    @switch (session.state().status) {
      @case ('member') {
        <lw-design-list />
      }
      @case ('visitor') {
        <lw-welcome />
      }
      @case ('failed') {
        <lw-welcome>
          <lw-failed-panel
            title="The server can’t be reached"
            text="Your designs are safe there, but can’t be shown now. What this browser has can be worked on."
            (again)="session.load()"
          />
          <lw-kept-list />
        </lw-welcome>
      }
      @default {
        <h1 class="lw-unseen">Bench</h1>
        <p class="lw-quiet" role="status">Opening the bench …</p>
      }
    }
  `,
  host: { class: 'lw-page' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage {
  protected readonly session = inject(SessionStore);
}
