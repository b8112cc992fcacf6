import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
  untracked,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatCheckboxModule } from '@angular/material/checkbox';
import { MatIconModule } from '@angular/material/icon';
import { type Layer, MAX_LAYERS, repeatedGroup } from '@shared/design';
import type { Steel } from '@shared/steels';
import type { Format } from '@shared/units';
import { LengthField } from '../../ui/length-field/length-field';
import { NumberField } from '../../ui/number-field/number-field';
import { SteelPicker } from '../../ui/steel-picker/steel-picker';

/** What is laid with how many repeats. */
interface Group {
  readonly layers: readonly Layer[];
  readonly times: number;
  readonly endOnFirst: boolean;
}

/** Lays a group of layers over and over: "1084 then 15N20, 7 times, end on 1084". */
@Component({
  selector: 'lw-group-form',
  imports: [LengthField, MatButtonModule, MatCheckboxModule, MatIconModule, NumberField, SteelPicker],
  templateUrl: './group-form.html',
  styleUrl: './group-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GroupForm {
  /** Whose stack it is; another bar begins the form anew. */
  readonly barId = input.required<string>();
  /** The stack as it is: the form begins with what it repeats. */
  readonly stack = input.required<readonly Layer[]>();
  readonly steels = input.required<readonly Steel[]>();
  readonly atHand = input.required<readonly string[]>();
  readonly format = input.required<Format>();

  /** Layers to be laid instead of the stack. */
  readonly layAnew = output<readonly Layer[]>();
  /** Layers to be laid on top of it. */
  readonly layOnTop = output<readonly Layer[]>();

  protected readonly group = linkedSignal<string, Group>({
    source: this.barId,
    computation: () => groupOf(untracked(this.stack)),
  });
  protected readonly layers = computed(() => {
    const { layers, times, endOnFirst } = this.group();
    return repeatedGroup(layers, times, endOnFirst);
  });
  protected readonly heightMm = computed(() =>
    this.layers().reduce((sum, layer) => sum + layer.thicknessMm, 0),
  );
  protected readonly isTooMany = computed(() => this.layers().length > MAX_LAYERS);
  protected readonly isTooManyOnTop = computed(() => this.stack().length + this.layers().length > MAX_LAYERS);
  protected readonly mostLayers = MAX_LAYERS;
  protected readonly firstName = computed(() => {
    const first = this.group().layers[0]?.steel;
    return this.steels().find((steel) => steel.id === first)?.name ?? 'the first';
  });

  protected change(place: number, change: Partial<Layer>): void {
    this.group.update((group) => ({
      ...group,
      layers: group.layers.map((layer, at) => (at === place ? { ...layer, ...change } : layer)),
    }));
  }

  protected add(): void {
    this.group.update((group) => {
      const used = new Set(group.layers.map((layer) => layer.steel));
      const steel = this.atHand().find((id) => !used.has(id)) ?? group.layers[0]?.steel ?? '';
      return {
        ...group,
        layers: [...group.layers, { steel, thicknessMm: group.layers[0]?.thicknessMm ?? 3 }],
      };
    });
  }

  protected remove(place: number): void {
    this.group.update((group) => ({ ...group, layers: group.layers.filter((_, at) => at !== place) }));
  }

  protected setTimes(times: number | undefined): void {
    if (times !== undefined) this.group.update((group) => ({ ...group, times }));
  }

  protected setEndOnFirst(endOnFirst: boolean): void {
    this.group.update((group) => ({ ...group, endOnFirst }));
  }
}

/** What a stack repeats: the shortest group that gives the whole stack, with or without its first layer on top. */
function groupOf(stack: readonly Layer[]): Group {
  for (let length = 1; length <= Math.min(6, stack.length); length++) {
    const layers = stack.slice(0, length);
    const repeats = stack.every((layer, at) => isAlike(layer, layers[at % length]));
    const rest = stack.length % length;
    if (repeats && (rest === 0 || (rest === 1 && stack.length > length))) {
      return { layers, times: Math.floor(stack.length / length), endOnFirst: rest === 1 && length > 1 };
    }
  }
  const [first] = stack;
  const other = stack.find((layer) => layer.steel !== first?.steel);
  return { layers: [first, other].filter((layer) => layer !== undefined), times: 6, endOnFirst: true };
}

function isAlike(a: Layer, b: Layer | undefined): boolean {
  return a.steel === b?.steel && a.thicknessMm === b.thicknessMm;
}
