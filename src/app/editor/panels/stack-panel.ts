import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatExpansionModule } from '@angular/material/expansion';
import { MatIconModule } from '@angular/material/icon';
import { MatTooltipModule } from '@angular/material/tooltip';
import {
  type Layer,
  MAX_LAYERS,
  type Stack,
  setLayers,
  setStackSize,
  setThicknessRatio,
  swapSteel,
} from '@shared/design';
import { toneOf } from '@shared/steels';
import { UnitsStore } from '../../core/units/units-store';
import { LengthField } from '../../ui/length-field/length-field';
import { NumberField } from '../../ui/number-field/number-field';
import { SteelPicker } from '../../ui/steel-picker/steel-picker';
import { DesignStore } from '../design-store';
import { LayerGrid } from '../twin/layer-grid';
import { LayerWork } from '../twin/layer-work';
import { GroupForm } from './group-form';
import { SteelShelf } from './steel-shelf';

/** The form of a stack: its size, its layers as a grid, groups to lay, steels to swap, the ratio of dark to bright. */
@Component({
  selector: 'lw-stack-panel',
  imports: [
    GroupForm,
    LayerGrid,
    LengthField,
    MatButtonModule,
    MatExpansionModule,
    MatIconModule,
    MatTooltipModule,
    NumberField,
    SteelPicker,
    SteelShelf,
  ],
  templateUrl: './stack-panel.html',
  styleUrls: ['./panel.scss', './stack-panel.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(focusout)': 'store.closeRun()' },
})
export class StackPanel {
  protected readonly store = inject(DesignStore);
  protected readonly units = inject(UnitsStore);
  protected readonly work = inject(LayerWork);

  protected readonly bar = computed(() => this.store.selected().bar);
  protected readonly stack = computed(() => this.bar().start as Stack);
  protected readonly layers = computed(() => this.store.selection().layers);
  protected readonly hasRoom = computed(() => this.stack().layers.length < MAX_LAYERS);

  /** Thickness and steel that all selected layers share; undefined and null where they differ. */
  protected readonly shared = computed(() => {
    const chosen = [...this.layers()].flatMap((place) => this.stack().layers[place] ?? []);
    const [first] = chosen;
    return {
      thicknessMm: chosen.every((layer) => layer.thicknessMm === first?.thicknessMm)
        ? first?.thicknessMm
        : undefined,
      steel: chosen.every((layer) => layer.steel === first?.steel) ? (first?.steel ?? null) : null,
    };
  });
  protected readonly chosenWords = computed(() => {
    const { size } = this.layers();
    return size === 1 ? `Layer ${[...this.layers()].map((place) => place + 1).join()}` : `${size} layers`;
  });

  /** The steels of this stack, from the darkest to the brightest. */
  protected readonly steelsHere = computed(() => {
    const ids = [...new Set(this.stack().layers.map((layer) => layer.steel))];
    return ids
      .flatMap((id) => this.store.steelTable().get(id) ?? [])
      .sort((a, b) => toneOf(a).brightness - toneOf(b).brightness);
  });
  /** How thick the darkest steel's layers are against the brightest's, where just two steels lie here. */
  protected readonly ratio = computed(() => {
    const [dark, bright, more] = this.steelsHere();
    if (!dark || !bright || more) return null;
    const mean = (steel: string): number => {
      const own = this.stack().layers.filter((layer) => layer.steel === steel);
      return own.reduce((sum, layer) => sum + layer.thicknessMm, 0) / own.length;
    };
    return { dark, bright, value: mean(dark.id) / mean(bright.id) };
  });

  private readonly swapFromChosen = signal<string | null>(null);
  protected readonly swapFrom = computed(() => {
    const laid = this.store.steelsLaid();
    const chosen = this.swapFromChosen();
    return chosen !== null && laid.includes(chosen) ? chosen : (laid[0] ?? null);
  });
  protected readonly steelsLaid = computed(() =>
    this.store.steelsLaid().flatMap((id) => this.store.steelTable().get(id) ?? []),
  );

  protected setSize(name: 'lengthMm' | 'widthMm', mm: number | undefined): void {
    if (mm === undefined) return;
    this.store.edit(
      (design) => setStackSize(design, this.bar().id, { [name]: mm }),
      `${this.bar().id}.${name}`,
    );
  }

  protected setThickness(mm: number | undefined): void {
    if (mm !== undefined) this.work.setThickness(this.layers(), mm);
  }

  protected lay(layers: readonly Layer[]): void {
    this.store.edit((design) => setLayers(design, this.bar().id, layers));
    this.store.selectLayers(new Set());
  }

  protected setRatio(ratio: number | undefined): void {
    const now = this.ratio();
    if (ratio === undefined || now === null) return;
    this.store.edit(
      (design) => setThicknessRatio(design, this.bar().id, now.dark.id, now.bright.id, ratio),
      `${this.bar().id}.ratio`,
    );
  }

  protected chooseSwapFrom(steel: string): void {
    this.swapFromChosen.set(steel);
  }

  protected swap(to: string): void {
    const from = this.swapFrom();
    if (from === null || from === to) return;
    this.store.edit((design) => swapSteel(design, from, to));
    this.swapFromChosen.set(to);
  }

  /** Onto the uppermost of the selected layers, or onto the stack. */
  protected layLayer(steel: string): void {
    const chosen = this.layers();
    this.work.insert(chosen.size > 0 ? Math.max(...chosen) + 1 : this.stack().layers.length, steel);
  }
}
