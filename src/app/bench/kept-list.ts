import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { KeptHere } from './kept-here';
import { Moment } from './moment';

/** While the server is away: its designs that this browser has, to go on with. */
@Component({
  selector: 'lw-kept-list',
  imports: [Moment, RouterLink],
  template: `
    @if (kept.designs().length > 0) {
      <section aria-labelledby="kept-title">
        <h2 id="kept-title">Kept in this browser</h2>
        <ul>
          @for (design of kept.designs(); track design.key) {
            <li>
              <a [routerLink]="['/designs', design.key]">{{ design.document.name }}</a>
              <span class="lw-quiet"
                >last changed <lw-moment [iso]="design.savedAt" />{{
                  design.isSaved ? '' : ', not saved yet'
                }}</span
              >
            </li>
          }
        </ul>
      </section>
    }
  `,
  styleUrl: './kept-list.scss',
  host: { '[hidden]': 'kept.designs().length === 0' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KeptList {
  protected readonly kept = inject(KeptHere);

  constructor() {
    void this.kept.load();
  }
}
