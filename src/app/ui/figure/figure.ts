import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { QuantityParts } from '@shared/units';

/** One figure with its name: large digits that keep their place, the unit small, what it was before if that is said. */
@Component({
  selector: 'lw-figure',
  templateUrl: './figure.html',
  styleUrl: './figure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Figure {
  readonly label = input.required<string>();
  readonly parts = input.required<QuantityParts>();
  /** The figure before the change; shown only where it differs. */
  readonly from = input<QuantityParts>();

  protected differs(from: QuantityParts): boolean {
    const to = this.parts();
    return from.number !== to.number || from.unit !== to.unit;
  }
}
