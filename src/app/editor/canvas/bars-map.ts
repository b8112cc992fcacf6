import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  inject,
  input,
  model,
  viewChild,
} from '@angular/core';
import type { BarState } from '@shared/bar';
import type { Bar, Design } from '@shared/design';
import type { Forging } from '@shared/forging';
import type { Hatch } from '@shared/steels';
import type { Format } from '@shared/units';
import { barsMap, piecesInto } from './bars-map-layout';
import { BAR_DRAG_TYPE } from './contract';
import { paintBarsMap } from './draw-bars-map';
import { HatchTiles } from './hatch-tiles';
import { paperUnder } from './paper';
import type { Drawing } from './sheet';
import { sheetIn } from './sheet-view';
import { inksOf } from './steel-inks';

/** A bar of the map, ready to be shown. */
interface ShownBar {
  readonly barId: string;
  readonly leftPx: number;
  readonly topPx: number;
  readonly name: string;
  readonly words: string;
  /** What the lines and the section show, for whoever can't see them: what it is, what it goes into. */
  readonly more: string;
  readonly isStopped: boolean;
}

/** The bars of a design and how they run into each other; each can be chosen, and dragged into an assembly. */
@Component({
  selector: 'lw-bars-map',
  templateUrl: './bars-map.html',
  styleUrl: './bars-map.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BarsMapCanvas {
  readonly design = input.required<Design>();
  /** The design worked out. */
  readonly forging = input.required<Forging>();
  readonly format = input.required<Format>();
  /** Hatches by steel id, where several drawings must agree. */
  readonly hatches = input<ReadonlyMap<string, Hatch>>();
  /** Id of the chosen bar. */
  readonly selected = model<string | null>(null);

  private readonly container = viewChild.required<ElementRef<HTMLDivElement>>('sheet');
  private readonly paper = paperUnder(inject<ElementRef<HTMLElement>>(ElementRef).nativeElement);
  private readonly tiles = new HatchTiles();
  private readonly size = sheetIn(this.container, () => this.drawings());

  protected readonly map = computed(() => barsMap(this.design().bars, this.size().widthPx));
  /** Each bar as it ends, or as far as it came. */
  private readonly ends = computed<ReadonlyMap<string, BarState>>(
    () =>
      new Map(
        this.forging().bars.flatMap((bar) => {
          const last = bar.states[bar.states.length - 1];
          return last ? [[bar.id, last.bar] as const] : [];
        }),
      ),
  );
  private readonly drawings = computed<readonly Drawing[]>(() => [
    {
      id: 'map',
      on: 'base',
      paint: paintBarsMap({
        map: this.map(),
        ends: this.ends(),
        chosen: this.selected(),
        inks: inksOf(this.forging().steels, this.hatches()),
        tiles: this.tiles,
        paper: this.paper(),
      }),
    },
  ]);
  protected readonly nodes = computed<readonly ShownBar[]>(() => {
    const bars = new Map(this.design().bars.map((bar) => [bar.id, bar]));
    return this.map().nodes.flatMap((node) => {
      const bar = bars.get(node.barId);
      return bar ? [{ ...node, ...this.wordsFor(bar) }] : [];
    });
  });

  protected dragged(event: DragEvent, barId: string): void {
    event.dataTransfer?.setData(BAR_DRAG_TYPE, barId);
    if (event.dataTransfer) event.dataTransfer.effectAllowed = 'copy';
  }

  private wordsFor(bar: Bar): Omit<ShownBar, 'barId' | 'leftPx' | 'topPx'> {
    const format = this.format();
    const forged = this.forging().bars.find((candidate) => candidate.id === bar.id);
    const end = this.ends().get(bar.id);
    const isStopped = forged?.refusal !== null;
    const size = end ? format.size([end.lengthMm, end.widthMm, end.thicknessMm]) : '';
    const words = isStopped ? (end ? 'Stops at a step' : 'Makes no bar yet') : size;
    const layers = end ? (end.layers === 1 ? '1 layer' : `${format.count(end.layers)} layers`) : '';
    const uses = this.design().bars.flatMap((user) => {
      const pieces = piecesInto(user).get(bar.id);
      return pieces ? [`${pieces === 1 ? '1 piece goes' : `${pieces} pieces go`} into ${user.name}`] : [];
    });
    const isResult = bar.id === this.design().result;
    const more = [
      ...(isResult ? ['the billet'] : []),
      bar.start.kind === 'stack' ? 'a stack' : `an assembly of ${bar.start.pieces.length} pieces`,
      ...(layers === '' ? [] : [layers]),
      ...uses,
    ].join(', ');
    return { name: bar.name, words, more, isStopped };
  }
}
