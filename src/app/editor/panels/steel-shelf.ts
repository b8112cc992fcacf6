import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Steel } from '@shared/steels';
import { SteelPicker } from '../../ui/steel-picker/steel-picker';
import { SteelSwatch } from '../../ui/steel-swatch/steel-swatch';
import { STEEL_DRAG_TYPE } from '../canvas/contract';

/** Steels to be laid: pressed they go onto the stack, dragged they go where they are dropped on the drawing. */
@Component({
  selector: 'lw-steel-shelf',
  imports: [SteelPicker, SteelSwatch],
  templateUrl: './steel-shelf.html',
  styleUrl: './steel-shelf.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SteelShelf {
  readonly steels = input.required<readonly Steel[]>();
  /** Ids of those that lie on the shelf. */
  readonly atHand = input.required<readonly string[]>();
  readonly isDisabled = input(false);

  readonly lay = output<string>();

  protected readonly shelf = computed(() =>
    this.atHand().flatMap((id) => this.steels().find((steel) => steel.id === id) ?? []),
  );

  protected dragged(event: DragEvent, steel: string): void {
    event.dataTransfer?.setData(STEEL_DRAG_TYPE, steel);
    if (event.dataTransfer) event.dataTransfer.effectAllowed = 'copy';
  }
}
