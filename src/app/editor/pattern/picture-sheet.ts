import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  type ElementRef,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatIconButton } from '@angular/material/button';
import type { Format } from '@shared/units';
import { EMPTY, Subject, catchError, map, startWith, switchMap } from 'rxjs';
import { ComputeClient } from '../../core/compute/compute-client';
import type { Probe } from '../../core/compute/probe';
import { listenOn } from '../canvas/sheet-events';
import type { ToolInput } from '../canvas/tool';
import { type AreaPx, type PointMm, type PointPx, panned, toMm, toPx } from '../canvas/viewport';
import { ZoomView } from '../canvas/zoom-view';
import { elementSize } from './element-size';
import { frameOf, shareAt } from './frame';
import { KEY_ZOOM, pictureKey } from './picture-keys';
import { PictureMaker, type Wanted } from './picture-maker';
import { type PictureSource, orderOf } from './picture-source';
import { IDLE_TOOL, type PictureTool, pictureTool } from './picture-tool';
import { scaleBar } from './scale-bar';
import { drawPicture } from './shown-picture';

/** Kept free around a picture that just fits, px: below it stand the scale bar and the buttons. */
const MARGIN_PX = { side: 10, top: 10, bottom: 52 } as const;
const SCALE_BAR_PX = 140;

/** A place that is pointed at, and by what: a hovering mouse points at nothing any more when it leaves. */
interface Pointed {
  readonly at: PointMm;
  readonly by: 'hover' | 'tap' | 'keys';
}

/** What was found at a place. */
export interface Found {
  readonly probe: Probe | null;
  readonly isByKeys: boolean;
}

let nextId = 0;

/** The picture of a surface, to be zoomed, pushed about and probed with pointer, fingers or keys. */
@Component({
  selector: 'lw-picture-sheet',
  imports: [MatIconButton],
  templateUrl: './picture-sheet.html',
  styleUrl: './picture-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PictureSheet {
  readonly source = input.required<PictureSource>();
  readonly format = input.required<Format>();
  /** What is shown, in words. */
  readonly text = input.required<string>();
  /** What was found under the crosshair, to be read out. */
  readonly announcement = input('');
  /** What is under the pointer or the crosshair; null while nothing is pointed at. */
  readonly found = output<Found | null>();

  protected readonly id = `lw-picture-${nextId++}`;
  protected readonly zoomStep = KEY_ZOOM ** 2;
  private readonly client = inject(ComputeClient);
  private readonly sheet = viewChild.required<ElementRef<HTMLDivElement>>('sheet');
  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('canvas');
  private readonly size = elementSize(this.sheet);

  private readonly extent = computed(
    () => ({ acrossMm: this.source().view.widthMm, upMm: this.source().view.heightMm }),
    { equal: (a, b) => a.acrossMm === b.acrossMm && a.upMm === b.upMm },
  );
  private readonly area = computed<AreaPx>(() => {
    const { widthPx, heightPx } = this.size();
    return {
      leftPx: MARGIN_PX.side,
      topPx: MARGIN_PX.top,
      widthPx: Math.max(1, widthPx - 2 * MARGIN_PX.side),
      heightPx: Math.max(1, heightPx - MARGIN_PX.top - MARGIN_PX.bottom),
    };
  });
  protected readonly zoomed = new ZoomView(this.extent, this.area, signal(1));
  protected readonly tool = signal<PictureTool>(IDLE_TOOL);

  private readonly wanted = computed<Wanted | null>(() => {
    const { widthPx, heightPx, pixelRatio } = this.size();
    if (widthPx === 0 || heightPx === 0) return null;
    const source = this.source();
    const whole = { leftPx: 0, topPx: 0, widthPx, heightPx };
    const frame = frameOf(source.view, this.zoomed.viewport(), whole, pixelRatio);
    return frame && { source, frame };
  });
  protected readonly maker = new PictureMaker(this.wanted);

  private readonly pointed = signal<Pointed | null>(null);
  /** Where the crosshair stands on the sheet; a mouse brings its own. */
  protected readonly mark = computed(() => {
    const pointed = this.pointed();
    return pointed && pointed.by !== 'hover' ? toPx(this.zoomed.viewport(), pointed.at) : null;
  });
  protected readonly bar = computed(() =>
    this.size().widthPx === 0
      ? null
      : scaleBar(
          this.zoomed.viewport().pxPerMm,
          Math.min(SCALE_BAR_PX, this.size().widthPx / 3),
          this.format(),
        ),
  );

  constructor() {
    effect(() => this.draw());
    this.probeWhatIsPointedAt();
    const stop = new AbortController();
    inject(DestroyRef).onDestroy(() => stop.abort());
    afterNextRender(() => {
      const sheet = this.sheet().nativeElement;
      listenOn(
        sheet,
        {
          input: (input) => this.act(input),
          hover: (at) => this.hovered(at),
          zoom: (at, factor) => this.zoomed.zoomBy(factor, at),
          push: (byXPx, byYPx) => this.push(byXPx, byYPx),
          key: (event) => this.keyed(event),
          isBusy: () => this.tool().kind !== 'idle',
          holdsTouch: () => this.tool().kind === 'pinching',
          dropType: '',
          dropOver: () => undefined,
          drop: () => undefined,
        },
        stop.signal,
      );
    });
  }

  private draw(): void {
    const { widthPx, heightPx, pixelRatio } = this.size();
    const { under, over } = this.maker.pictures();
    const viewport = this.zoomed.viewport();
    const canvas = this.canvas().nativeElement;
    const width = Math.round(widthPx * pixelRatio);
    const height = Math.round(heightPx * pixelRatio);
    if (canvas.width !== width) canvas.width = width;
    if (canvas.height !== height) canvas.height = height;
    const context = canvas.getContext('2d');
    if (context === null) return;
    context.clearRect(0, 0, width, height);
    if (under) drawPicture(context, under, viewport, pixelRatio);
    if (over) drawPicture(context, over, viewport, pixelRatio);
  }

  /** Asks what lies under the place that is pointed at, the newest question only, and again when the bar changes. */
  private probeWhatIsPointedAt(): void {
    const asked = new Subject<{ source: PictureSource; pointed: Pointed } | null>();
    effect(() => {
      const source = this.source();
      const pointed = this.pointed();
      untracked(() => asked.next(pointed && { source, pointed }));
    });
    const found = toSignal(
      asked.pipe(
        switchMap((question) => {
          if (question === null) return [null];
          const { source, pointed } = question;
          const { widthMm, heightMm } = source.view;
          const share = { across: pointed.at.acrossMm / widthMm, up: pointed.at.upMm / heightMm };
          const { design, at, surface } = orderOf(source);
          return this.client.probe({ design, at, surface, ...share }).pipe(
            map((probe): Found => ({ probe, isByKeys: pointed.by === 'keys' })),
            // The picture itself says what is wrong.
            catchError(() => EMPTY),
          );
        }),
        startWith(null),
      ),
      { requireSync: true },
    );
    effect(() => this.found.emit(found()));
  }

  private act(input: ToolInput): void {
    const sight = { viewport: this.zoomed.viewport(), extent: this.extent(), area: this.area() };
    const { tool, viewport, point } = pictureTool(this.tool(), input, sight);
    this.tool.set(tool);
    if (viewport) this.zoomed.set(viewport);
    if (point) this.point(toMm(this.zoomed.viewport(), point), 'tap');
  }

  private hovered(at: PointPx | null): void {
    if (at === null) {
      if (this.pointed()?.by === 'hover') this.pointed.set(null);
      return;
    }
    this.point(toMm(this.zoomed.viewport(), at), 'hover');
  }

  /** Points at a place of the surface; a place beside it is none. */
  private point(at: PointMm, by: Pointed['by']): void {
    const viewport = this.zoomed.viewport();
    const isOn = shareAt(this.source().view, viewport, toPx(viewport, at)) !== null;
    this.pointed.set(isOn ? { at, by } : null);
  }

  private keyed(event: KeyboardEvent): boolean {
    const asked = pictureKey(event);
    if (asked === null) return false;
    switch (asked.kind) {
      case 'zoom':
        this.zoomed.zoomBy(asked.factor, this.mark() ?? undefined);
        return true;
      case 'fit':
        this.zoomed.fit();
        return true;
      case 'push':
        this.push(asked.byXPx, asked.byYPx);
        return true;
      case 'leave':
        if (this.pointed() === null) return false;
        this.pointed.set(null);
        return true;
      case 'middle':
        this.pointed.set({ at: this.middle(), by: 'keys' });
        this.bringIntoView();
        return true;
      case 'point':
        this.movePoint(asked.byXPx, asked.byYPx);
        return true;
    }
  }

  private movePoint(byXPx: number, byYPx: number): void {
    const { pxPerMm } = this.zoomed.viewport();
    const { acrossMm, upMm } = this.extent();
    const from = this.pointed()?.at ?? this.middle();
    this.pointed.set({
      at: {
        acrossMm: Math.min(acrossMm, Math.max(0, from.acrossMm + byXPx / pxPerMm)),
        upMm: Math.min(upMm, Math.max(0, from.upMm - byYPx / pxPerMm)),
      },
      by: 'keys',
    });
    this.bringIntoView();
  }

  /** Pushes the picture as little as can be, so that the crosshair is seen. */
  private bringIntoView(): void {
    const mark = this.mark();
    if (mark === null) return;
    const { leftPx, topPx, widthPx, heightPx } = this.area();
    const byXPx = Math.max(leftPx - mark.xPx, 0) - Math.max(mark.xPx - leftPx - widthPx, 0);
    const byYPx = Math.max(topPx - mark.yPx, 0) - Math.max(mark.yPx - topPx - heightPx, 0);
    if (byXPx !== 0 || byYPx !== 0) this.push(byXPx, byYPx);
  }

  private push(byXPx: number, byYPx: number): void {
    this.zoomed.set(panned(this.zoomed.viewport(), byXPx, byYPx, this.extent(), this.area()));
  }

  private middle(): PointMm {
    const { acrossMm, upMm } = this.extent();
    return { acrossMm: acrossMm / 2, upMm: upMm / 2 };
  }
}
