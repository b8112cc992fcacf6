import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import type { Steel } from '@shared/steels';
import { SteelSwatch } from '../steel-swatch/steel-swatch';
import { steelGroups } from './steel-groups';

/** Chooses a steel by name, with its etched tone; typing the first signs of a name goes to it. */
@Component({
  selector: 'lw-steel-picker',
  imports: [MatFormFieldModule, MatSelectModule, SteelSwatch],
  templateUrl: './steel-picker.html',
  styleUrl: './steel-picker.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SteelPicker {
  readonly label = input.required<string>();
  /** Id of the steel chosen; null for none. */
  readonly steelId = input.required<string | null>();
  readonly steels = input.required<readonly Steel[]>();
  /** Ids that are offered first, such as those the design lays already. */
  readonly atHand = input<readonly string[]>([]);
  readonly atHandLabel = input('In this design');
  readonly hint = input<string>();

  readonly steelIdChange = output<string>();

  protected readonly groups = computed(() => steelGroups(this.steels(), this.atHand(), this.atHandLabel()));
  protected readonly chosen = computed(() => this.steels().find((steel) => steel.id === this.steelId()));
}
