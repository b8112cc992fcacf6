import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import type { ListRange } from '@angular/cdk/collections';
import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  DestroyRef,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Stack } from '@shared/design';
import { readLengthField } from '@shared/units';
import { filter, startWith, take } from 'rxjs';
import { UnitsStore } from '../../core/units/units-store';
import { steelGroups } from '../../ui/steel-picker/steel-groups';
import { SteelSwatch } from '../../ui/steel-swatch/steel-swatch';
import { DesignStore } from '../design-store';
import {
  COLUMNS,
  type Column,
  type GridPoint,
  type LayerRow,
  layerRows,
  placeWords,
  pointByKey,
} from './layer-rows';
import { LayerWork } from './layer-work';

/**
 * The stack as a grid, its top layer first: the drawing's twin and an editor by itself.
 *
 * Arrow keys go from cell to cell and select the layer, with Shift a run of them; Alt with up or down moves the
 * selected layers; Enter, F2 or typing edits the cell; Insert lays a layer like this one on top of it; Delete takes the
 * selected ones out. Rows outside the view are not in the page.
 */
@Component({
  selector: 'lw-layer-grid',
  imports: [CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport, SteelSwatch],
  templateUrl: './layer-grid.html',
  styleUrl: './layer-grid.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LayerGrid {
  protected readonly store = inject(DesignStore);
  protected readonly work = inject(LayerWork);
  private readonly units = inject(UnitsStore);
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);
  private readonly destroyRef = inject(DestroyRef);
  private readonly viewport = viewChild.required(CdkVirtualScrollViewport);
  private readonly drawn = signal<ListRange>({ start: 0, end: 0 });
  /** Whether the keyboard's cell is in the page; scrolled far away it isn't, and the grid takes its place in the tab order. */
  protected readonly isPointDrawn = computed(() => {
    const { row } = this.point();
    return row >= this.drawn().start && row < this.drawn().end;
  });

  private readonly stack = computed(() => this.store.selected().bar.start as Stack);
  protected readonly rows = computed(() =>
    layerRows(this.stack().layers, this.store.steelTable(), this.units.format()),
  );
  protected readonly groups = computed(() =>
    steelGroups(this.store.steels(), this.store.steelsLaid(), 'In this design'),
  );
  protected readonly columns = COLUMNS;
  protected readonly unit = computed(() => (this.units.system() === 'mm' ? 'mm' : 'in'));

  /** The cell that the keyboard is at; it goes with the layers when they are moved. */
  protected readonly point = linkedSignal<number, GridPoint>({
    source: () => this.rows().length,
    computation: (rows, before) => ({
      row: Math.min(before?.value.row ?? 0, rows - 1),
      column: before?.value.column ?? 'steel',
    }),
  });
  /** Where a run of layers that Shift extends began. */
  private anchor: number | null = null;
  /** The cell being edited, with what is typed into it. */
  protected readonly editing = signal<{ readonly place: number; readonly column: Column } | null>(null);
  protected readonly refusal = signal<string | null>(null);
  /** Rows are as high as a finger needs them where a finger points. */
  protected readonly rowPx = inject(DOCUMENT).defaultView?.matchMedia('(pointer: coarse)').matches ? 44 : 34;

  constructor() {
    afterNextRender(() => {
      this.viewport()
        .renderedRangeStream.pipe(
          startWith(this.viewport().getRenderedRange()),
          takeUntilDestroyed(this.destroyRef),
        )
        .subscribe((range) => this.drawn.set(range));
    });
  }

  protected readonly byPlace = (_: number, row: LayerRow): number => row.place;

  protected label(row: LayerRow, column: Column): string {
    const place = placeWords(row.place, this.rows().length);
    return column === 'place' ? place : `${place}, ${column === 'steel' ? row.name : row.thickness}`;
  }

  protected isSelected(place: number): boolean {
    return this.store.selection().layers.has(place);
  }

  protected isAt(row: LayerRow, column: Column): boolean {
    const { row: at, column: in_ } = this.point();
    return this.rows()[at]?.place === row.place && column === in_;
  }

  protected clicked(event: MouseEvent, row: LayerRow, column: Column): void {
    const at = this.rows().length - 1 - row.place;
    this.point.set({ row: at, column });
    if (event.shiftKey) this.extendTo(row.place);
    else if (event.ctrlKey || event.metaKey) this.toggle(row.place);
    else this.selectOnly(row.place);
  }

  protected key(event: KeyboardEvent): void {
    const { row, column } = this.point();
    const place = this.placeOf(row);
    if (event.altKey) {
      if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
        event.preventDefault();
        this.moveBy(event.key === 'ArrowUp' ? 1 : -1, place);
      }
      return;
    }
    if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 'a') {
      event.preventDefault();
      this.work.selectAll();
      return;
    }
    const to = pointByKey(this.point(), this.rows().length, event);
    if (to !== null) {
      event.preventDefault();
      this.goTo(to, event.shiftKey);
      return;
    }
    if (event.ctrlKey || event.metaKey) return;
    this.act(event, place, column);
  }

  private act(event: KeyboardEvent, place: number, column: Column): void {
    switch (event.key) {
      case 'Enter':
      case 'F2':
        if (column !== 'place') this.edit(place, column);
        break;
      case ' ':
        this.toggle(place);
        break;
      case 'Delete':
      case 'Backspace':
        this.work.remove(this.orThis(place));
        this.goToPlace(Math.min(...this.store.selection().layers));
        break;
      case 'Insert':
        this.work.insert(place + 1, this.stack().layers[place]?.steel ?? '');
        this.goToPlace(place + 1);
        break;
      default:
        if (event.key.length !== 1 || column === 'place') return;
        this.edit(place, column, column === 'thickness' ? event.key : undefined);
    }
    event.preventDefault();
  }

  /** Opens a cell; `typed` takes the place of what is in it. */
  protected edit(place: number, column: Column, typed?: string): void {
    this.refusal.set(null);
    this.editing.set({ place, column });
    afterNextRender(
      () => {
        const editor = this.element.nativeElement.querySelector<HTMLInputElement | HTMLSelectElement>(
          '.editor',
        );
        if (!editor) return;
        editor.focus();
        if (editor instanceof HTMLInputElement) {
          if (typed === undefined) editor.select();
          else editor.value = typed;
        }
      },
      { injector: this.injector },
    );
  }

  protected editorKey(event: KeyboardEvent, row: LayerRow): void {
    event.stopPropagation();
    if (event.key === 'Escape') {
      event.preventDefault();
      this.close();
    } else if (event.key === 'Enter' && event.target instanceof HTMLInputElement) {
      event.preventDefault();
      if (this.takeThickness(event.target.value, row)) this.close();
    }
  }

  /** The editor is left by Tab or by a click elsewhere: what can be read is taken, what can't is explained and kept. */
  protected thicknessLeft(event: FocusEvent, row: LayerRow): void {
    if (this.editing() === null || !(event.target instanceof HTMLInputElement)) return;
    if (this.takeThickness(event.target.value, row)) this.editing.set(null);
  }

  protected steelChosen(event: Event, place: number): void {
    if (event.target instanceof HTMLSelectElement)
      this.work.setSteel(this.withThis(place), event.target.value);
    this.close();
  }

  protected steelLeft(): void {
    this.editing.set(null);
  }

  private takeThickness(text: string, row: LayerRow): boolean {
    const shown = { text: this.shownNumber(row), mm: row.thicknessMm };
    const reading = readLengthField(text, shown, this.units.system());
    if (!reading.ok) {
      this.refusal.set(reading.reason);
      return false;
    }
    if (reading.mm < 0.01 || reading.mm > 500) {
      const limits = [0.01, 500].map((mm) => this.units.format().length(mm)).join(' to ');
      this.refusal.set(`“${text.trim()}” is outside of what a layer can be: ${limits}.`);
      return false;
    }
    this.refusal.set(null);
    if (reading.mm !== row.thicknessMm) this.work.setThickness(this.withThis(row.place), reading.mm);
    return true;
  }

  protected shownNumber(row: LayerRow): string {
    return this.units.format().lengthParts(row.thicknessMm).number;
  }

  private close(): void {
    this.refusal.set(null);
    this.editing.set(null);
    this.store.closeRun();
    this.focusPoint();
  }

  private moveBy(by: 1 | -1, place: number): void {
    const places = this.orThis(place);
    this.work.moveBy(places, by);
    this.goToPlace(Math.min(this.rows().length - 1, Math.max(0, place + by)));
  }

  private goTo(to: GridPoint, extends_: boolean): void {
    this.point.set(to);
    const place = this.placeOf(to.row);
    if (extends_) this.extendTo(place);
    else this.selectOnly(place);
    this.focusPoint();
  }

  private goToPlace(place: number): void {
    this.anchor = place;
    this.point.update(({ column }) => ({ row: this.rows().length - 1 - place, column }));
    this.focusPoint();
  }

  /** Brings the keyboard to its cell, and the cell into view; a row far away has to be drawn first. */
  protected focusPoint(): void {
    const { row } = this.point();
    this.showRow(row);
    this.viewport()
      .renderedRangeStream.pipe(
        startWith(this.viewport().getRenderedRange()),
        filter(({ start, end }) => row >= start && row < end),
        take(1),
        takeUntilDestroyed(this.destroyRef),
      )
      .subscribe(() =>
        afterNextRender(
          () =>
            this.element.nativeElement.querySelector<HTMLElement>('[role=gridcell][tabindex="0"]')?.focus(),
          { injector: this.injector },
        ),
      );
  }

  private showRow(row: number): void {
    const viewport = this.viewport();
    const top = row * this.rowPx;
    const from = viewport.measureScrollOffset('top');
    const height = viewport.getViewportSize();
    if (top < from) viewport.scrollToOffset(top);
    else if (top + this.rowPx > from + height) viewport.scrollToOffset(top + this.rowPx - height);
  }

  private placeOf(row: number): number {
    return this.rows().length - 1 - row;
  }

  private selectOnly(place: number): void {
    this.anchor = place;
    this.store.selectLayers(new Set([place]));
  }

  private extendTo(place: number): void {
    this.anchor ??= place;
    const [from, to] = [Math.min(this.anchor, place), Math.max(this.anchor, place)];
    this.store.selectLayers(new Set(Array.from({ length: to - from + 1 }, (_, i) => from + i)));
  }

  private toggle(place: number): void {
    const next = new Set(this.store.selection().layers);
    if (!next.delete(place)) next.add(place);
    this.anchor = place;
    this.store.selectLayers(next);
  }

  /** The selected layers, or the one at hand if none is. */
  private orThis(place: number): ReadonlySet<number> {
    const { layers } = this.store.selection();
    return layers.size > 0 ? layers : new Set([place]);
  }

  /** The selected layers if the one at hand is among them, else that one alone. */
  private withThis(place: number): ReadonlySet<number> {
    const { layers } = this.store.selection();
    return layers.has(place) ? layers : new Set([place]);
  }
}
