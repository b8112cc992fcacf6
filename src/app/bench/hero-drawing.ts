import { ChangeDetectionStrategy, Component } from '@angular/core';
import { JourneyDrawing } from './journey-drawing';
import { forgedStarters, type ForgedStarter } from './starter-figures';

/** What the program does, shown on the plainest of the starters. */
@Component({
  selector: 'lw-hero-drawing',
  imports: [JourneyDrawing],
  template: `
    <figure>
      <lw-journey-drawing [forging]="plainest.forging" />
      <figcaption>
        “{{ plainest.starter.title }}”, worked out: every state from the side, to one scale.
      </figcaption>
    </figure>
  `,
  styles: `
    figcaption {
      padding-top: 8px;
      color: var(--lw-quiet);
      font-size: 0.875rem;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeroDrawing {
  protected readonly plainest = forgedStarters()[0] as ForgedStarter;
}
