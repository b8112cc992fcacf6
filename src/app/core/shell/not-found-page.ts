import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';

@Component({
  selector: 'lw-not-found-page',
  imports: [RouterLink],
  template: `
    <h1>Nothing lies here</h1>
    <p>This address leads nowhere. The page was moved, or the address is mistyped.</p>
    <p><a routerLink="/">Go to the bench</a></p>
  `,
  styles: `
    p {
      padding-top: 12px;
    }
  `,
  host: { class: 'lw-page' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFoundPage {}
