import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  linkedSignal,
  model,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import type { Layer, Stack } from '@shared/design';
import type { Hatch, Steel } from '@shared/steels';
import type { Format } from '@shared/units';
import { type GestureEnd, STEEL_DRAG_TYPE, type StackGesture } from './contract';
import { type StackPicture, paintLabels, paintStack } from './draw-stack';
import { headlineOf, paintWork } from './draw-stack-work';
import { HatchTiles } from './hatch-tiles';
import { landingPlace } from './landing';
import { measureText, paperUnder } from './paper';
import { NOTHING_SELECTED, type Selection, adopted, isSameChoice, only } from './selection';
import type { Drawing } from './sheet';
import { listenOn } from './sheet-events';
import { sheetIn } from './sheet-view';
import { type StackGeometry, type StackHit, seamMm, stackGeometry, thicknessOf } from './stack-geometry';
import { ZOOM_STEP, stackKey } from './stack-keys';
import type { StackSheet } from './stack-press';
import { labelAt, labelColumn, stackFrame, widestLabelPx } from './stack-scene';
import { selectionText, stackText } from './stack-text';
import { IDLE, type StackTool, hitOn, holdsTouch, isEditing, stackTool } from './stack-tool';
import { inksOf } from './steel-inks';
import type { PointerDevice, ToolInput } from './tool';
import { type PointPx, isSameArea, panned, toMm, toPx } from './viewport';
import { ZoomView } from './zoom-view';

let nextId = 0;

/**
 * The end section of a stack, to scale, to be worked on with pointer, fingers or keys. It changes nothing itself: what
 * is done comes out as gestures, see `contract.ts`.
 */
@Component({
  selector: 'lw-stack-canvas',
  imports: [MatIconButton],
  templateUrl: './stack-canvas.html',
  styleUrl: './drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StackCanvas {
  readonly stack = input.required<Stack>();
  /** Steels by id; one that is missing is drawn grey and called by its id. */
  readonly steels = input.required<ReadonlyMap<string, Steel>>();
  readonly format = input.required<Format>();
  /** Thicknesses that can be had, mm: a drawn edge snaps to them. */
  readonly stockThicknessesMm = input<readonly number[]>([]);
  /** Hatches by steel id, where several drawings must agree; else each steel's own, kept apart within the stack. */
  readonly hatches = input<ReadonlyMap<string, Hatch>>();
  /** Places of the layers that are chosen, 0 at the bottom. */
  readonly selected = model<ReadonlySet<number>>(new Set());
  /** Scale as a multiple of the one at which everything just fits. */
  readonly zoom = model(1);

  readonly gestureStart = output();
  readonly gestureEdit = output<StackGesture>();
  readonly gestureEnd = output<GestureEnd>();

  protected readonly id = `lw-stack-${nextId++}`;
  private readonly container = viewChild.required<ElementRef<HTMLDivElement>>('sheet');
  private readonly paper = paperUnder(inject<ElementRef<HTMLElement>>(ElementRef).nativeElement);
  private readonly tiles = new HatchTiles();
  private readonly size = sheetIn(this.container, () => this.drawings());

  private readonly tool = signal<StackTool>(IDLE);
  private readonly hover = signal<StackHit>({ kind: 'empty' });
  private readonly dropAt = signal<number | null>(null);
  private readonly isCoarse = signal(matchMedia('(pointer: coarse)').matches);
  private readonly isChosenByKey = signal(false);
  private readonly selection = linkedSignal<ReadonlySet<number>, Selection>({
    source: this.selected,
    computation: (places, before) => {
      const last = before?.value ?? NOTHING_SELECTED;
      return isSameChoice(places, last.places) ? last : adopted(places, last);
    },
  });

  private readonly frame = computed(() => {
    // New fonts are measured anew.
    this.paper();
    const widestPx = widestLabelPx(this.ground(), this.steels(), this.format(), measureText);
    return stackFrame(this.size().widthPx, this.size().heightPx, widestPx);
  });
  /** As the document has it; during a gesture as it was at its start, for that is what the gesture speaks of. */
  private readonly ground = linkedSignal<{ stack: Stack; isHeld: boolean }, Stack>({
    source: () => ({ stack: this.stack(), isHeld: isEditing(this.tool()) }),
    computation: ({ stack, isHeld }, before) => (isHeld && before ? before.value : stack),
  });
  private readonly groundGeometry = computed(() => stackGeometry(this.ground()));
  /** With the edge where it is drawn to. */
  private readonly layers = computed<readonly Layer[]>(() => {
    const tool = this.tool();
    const { layers } = this.ground();
    if (tool.kind !== 'resizing') return layers;
    const { thicknessMm } = tool.thickness;
    return layers.map((layer, place) => (place === tool.place ? { ...layer, thicknessMm } : layer));
  });
  private readonly geometry = computed<StackGeometry>(() =>
    stackGeometry({ widthMm: this.ground().widthMm, layers: this.layers() }),
  );
  private readonly extent = computed(
    () => ({ acrossMm: this.groundGeometry().widthMm, upMm: this.groundGeometry().heightMm }),
    { equal: (a, b) => a.acrossMm === b.acrossMm && a.upMm === b.upMm },
  );
  private readonly area = computed(() => this.frame().area, { equal: isSameArea });
  /** Two steps of the keys. */
  protected readonly zoomStep = ZOOM_STEP ** 2;
  protected readonly view = new ZoomView(this.extent, this.area, this.zoom);

  private readonly inks = computed(() => {
    const ids = [...new Set(this.ground().layers.map((layer) => layer.steel))];
    const steels = ids.map((id) => this.steels().get(id));
    const index = new Map(ids.map((id, i) => [id, i]));
    return {
      inks: inksOf(steels, this.hatches()),
      inkOf: Uint16Array.from(this.ground().layers, (layer) => index.get(layer.steel) ?? 0),
    };
  });
  /** While layers are carried, the choice that the document knows is already where they would land. */
  private readonly chosen = computed<ReadonlySet<number>>(() => {
    const tool = this.tool();
    return tool.kind === 'moving' ? tool.places : this.selection().places;
  });
  private readonly column = computed(() => {
    // New fonts are measured anew.
    this.paper();
    return labelColumn({
      stack: { layers: this.layers() },
      steels: this.steels(),
      format: this.format(),
      geometry: this.geometry(),
      viewport: this.view.viewport(),
      frame: this.frame(),
      chosen: this.chosen(),
      measure: measureText,
    });
  });
  private readonly isCarrying = computed(() => this.tool().kind === 'moving');
  private readonly picture = computed<StackPicture>(() => ({
    geometry: this.geometry(),
    viewport: this.view.viewport(),
    frame: this.frame(),
    column: this.column(),
    chosen: this.chosen(),
    isCarrying: this.isCarrying(),
    format: this.format(),
    paper: this.paper(),
    ...this.inks(),
    tiles: this.tiles,
  }));
  private readonly base = computed<readonly Drawing[]>(() => [
    { id: 'stack', on: 'base', paint: paintStack(this.picture()) },
    // While an edge is drawn, the scale of stock thicknesses stands in their place.
    ...(this.tool().kind === 'resizing'
      ? []
      : [{ id: 'labels', on: 'base', paint: paintLabels(this.picture()) } as const]),
  ]);
  private readonly drawings = computed<readonly Drawing[]>(() => [
    ...this.base(),
    {
      id: 'work',
      on: 'over',
      paint: paintWork({
        picture: this.picture(),
        tool: this.tool(),
        hover: this.hover(),
        dropAt: this.dropAt(),
        stockMm: this.stockThicknessesMm(),
        headline: this.headline(),
        isCoarse: this.isCoarse(),
      }),
    },
  ]);
  private readonly headline = computed(() => {
    const hover = this.hover();
    const stack = this.ground();
    const shown = hover.kind === 'empty' ? this.chosen() : new Set([hover.place]);
    const atRest =
      shown.size > 0
        ? selectionText(stack, shown, this.steels(), this.format())
        : `End section, ${this.format().length(stack.lengthMm)} long`;
    return headlineOf(this.tool(), this.dropAt(), stack.layers.length, this.format(), atRest);
  });

  protected readonly text = computed(() => stackText(this.stack(), this.steels(), this.format()));
  protected readonly announcement = computed(() =>
    this.isChosenByKey()
      ? selectionText(this.stack(), this.selection().places, this.steels(), this.format())
      : '',
  );

  constructor() {
    const stop = new AbortController();
    inject(DestroyRef).onDestroy(() => stop.abort());
    afterNextRender(() => {
      listenOn(
        this.container().nativeElement,
        {
          input: (input) => this.dispatch(input),
          hover: (at, device) => this.hovered(at, device),
          zoom: (at, factor) => this.view.zoomBy(factor, at),
          push: (byXPx, byYPx) =>
            this.view.set(panned(this.view.viewport(), byXPx, byYPx, this.extent(), this.area())),
          key: (event) => this.keyed(event),
          isBusy: () => this.tool().kind !== 'idle',
          holdsTouch: () => holdsTouch(this.tool()),
          dropType: STEEL_DRAG_TYPE,
          dropOver: (at) => this.dropAt.set(at && this.landing(at)),
          drop: (at, steel) => this.dropped(at, steel),
        },
        stop.signal,
      );
    });
  }

  /** What the keys are on stays where it is, as long as it is in view. */
  protected zoomBy(factor: number): void {
    const { cursor } = this.selection();
    const { leftPx, topPx, widthPx, heightPx } = this.area();
    const geometry = this.groundGeometry();
    const upMm = cursor === null ? 0 : seamMm(geometry, cursor) + thicknessOf(geometry, cursor) / 2;
    const { yPx } = toPx(this.view.viewport(), { acrossMm: 0, upMm });
    const isInView = cursor !== null && yPx >= topPx && yPx <= topPx + heightPx;
    this.view.zoomBy(factor, isInView ? { xPx: leftPx + widthPx / 2, yPx } : undefined);
  }

  private sheetNow(): StackSheet {
    return {
      geometry: this.groundGeometry(),
      viewport: this.view.viewport(),
      area: this.area(),
      selection: this.selection(),
      stockMm: this.stockThicknessesMm(),
      system: this.format().system,
      labelAt: (at) => labelAt(this.column(), at),
    };
  }

  private dispatch(input: ToolInput): void {
    if (input.kind === 'press') this.isCoarse.set(input.device === 'touch');
    const { tool, out } = stackTool(this.tool(), input, this.sheetNow());
    this.tool.set(tool);
    this.cursorFor(tool, this.hover());
    for (const asked of out) {
      switch (asked.kind) {
        case 'start':
          this.gestureStart.emit();
          break;
        case 'edit':
          this.gestureEdit.emit(asked.gesture);
          break;
        case 'end':
          this.gestureEnd.emit(asked.end);
          break;
        case 'select':
          this.choose(asked.selection, false);
          break;
        case 'view':
          this.view.set(asked.viewport);
          break;
      }
    }
  }

  private choose(selection: Selection, isByKey: boolean): void {
    this.isChosenByKey.set(isByKey);
    this.selection.set(selection);
    this.selected.set(selection.places);
  }

  private hovered(at: PointPx | null, device: PointerDevice): void {
    const hit: StackHit = at === null ? { kind: 'empty' } : hitOn(this.sheetNow(), at, device);
    const now = this.hover();
    const isSame =
      hit.kind === now.kind && (hit.kind === 'empty' || now.kind === 'empty' || hit.place === now.place);
    if (!isSame) this.hover.set(hit);
    this.cursorFor(this.tool(), hit);
  }

  private keyed(event: KeyboardEvent): boolean {
    const { key, shiftKey: shift, altKey: alt } = event;
    const press = { key, shift, alt, command: event.ctrlKey || event.metaKey };
    const asked = stackKey(press, this.stack().layers.length, this.selection());
    if (asked === null) return false;
    switch (asked.kind) {
      case 'zoom':
        this.zoomBy(asked.factor);
        return true;
      case 'fit':
        this.view.fit();
        return true;
      case 'gesture':
        this.whole(asked.gesture);
        break;
      case 'select':
        break;
    }
    this.choose(asked.selection, true);
    const { cursor } = asked.selection;
    const geometry = this.groundGeometry();
    if (cursor !== null) this.view.show(seamMm(geometry, cursor), seamMm(geometry, cursor + 1));
    return true;
  }

  private landing(at: PointPx): number {
    return landingPlace(this.groundGeometry(), toMm(this.view.viewport(), at).upMm);
  }

  private dropped(at: PointPx, steel: string): void {
    const place = this.landing(at);
    this.whole({ kind: 'insert', at: place, steel });
    this.choose(only(place), false);
  }

  private whole(gesture: StackGesture): void {
    this.gestureStart.emit();
    this.gestureEdit.emit(gesture);
    this.gestureEnd.emit('settle');
  }

  /** Set on the element itself: a pointer that moves is no reason to check the page. */
  private cursorFor(tool: StackTool, hover: StackHit): void {
    this.container().nativeElement.style.cursor = cursorOf(tool, hover);
  }
}

function cursorOf(tool: StackTool, hover: StackHit): string {
  switch (tool.kind) {
    case 'moving':
    case 'panning':
    case 'pinching':
      return 'grabbing';
    case 'resizing':
      return 'ns-resize';
    case 'marquee':
      return 'crosshair';
    default:
      if (hover.kind === 'layer') return 'grab';
      return hover.kind === 'empty' ? 'default' : 'ns-resize';
  }
}
