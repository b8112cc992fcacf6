import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The mark: a bar's end with its layers, the middle ones drawn down by a wedge. */
@Component({
  selector: 'lw-mark',
  template: `
    <svg viewBox="0 0 32 32" width="32" height="32" focusable="false">
      <rect x="3" y="5" width="26" height="22" rx="1" class="ground" />
      <path
        d="M3 9.5h8.5l4.5 4 4.5-4H29v4h-6.5l-6.5 5-6.5-5H3zM3 17.5h5.5l7.5 5.5 7.5-5.5H29v4h-5L17 27h-2l-7-5.5H3z"
      />
      <rect x="3" y="5" width="26" height="22" rx="1" class="edge" />
    </svg>
  `,
  styles: `
    :host {
      display: block;
      line-height: 0;
    }
    .ground {
      fill: none;
    }
    path {
      fill: var(--lw-ember);
    }
    .edge {
      fill: none;
      stroke: var(--lw-ink);
      stroke-width: 1.75;
    }
  `,
  host: { 'aria-hidden': 'true' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Mark {}
