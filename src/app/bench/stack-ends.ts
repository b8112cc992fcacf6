import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Forging } from '@shared/forging';
import { drawnStacks } from './starter-figures';

const GAP_MM = 8;
/** What the picture shows, mm: the same for every design, so that all are to one scale. */
const VIEW = { widthMm: 100, heightMm: 42 } as const;

/** The stacks of a design seen from their ends, side by side, to one scale for all designs. */
@Component({
  selector: 'lw-stack-ends',
  template: `
    <svg [attr.viewBox]="viewBox" preserveAspectRatio="xMinYMax meet" aria-hidden="true" focusable="false">
      @for (stack of placed(); track stack.barId) {
        <g [attr.transform]="stack.transform">
          @for (layer of stack.layers; track layer.y) {
            <rect
              [attr.y]="layer.y"
              [attr.width]="stack.widthMm"
              [attr.height]="layer.height"
              [attr.fill]="layer.fill"
            />
          }
          <rect class="outline" [attr.width]="stack.widthMm" [attr.height]="stack.heightMm" />
        </g>
      }
    </svg>
  `,
  styles: `
    :host {
      display: block;
    }
    svg {
      display: block;
      width: 100%;
      height: auto;
      overflow: visible;
    }
    rect {
      forced-color-adjust: none;
    }
    .outline {
      fill: none;
      stroke: var(--lw-edge);
      stroke-width: 1px;
      vector-effect: non-scaling-stroke;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StackEnds {
  readonly forging = input.required<Forging>();

  protected readonly viewBox = `0 0 ${VIEW.widthMm} ${VIEW.heightMm}`;
  protected readonly placed = computed(() => {
    let x = 0.5;
    return drawnStacks(this.forging()).map((stack) => {
      const transform = `translate(${x} ${VIEW.heightMm - 0.5 - stack.heightMm})`;
      x += stack.widthMm + GAP_MM;
      return { ...stack, transform };
    });
  });
}
