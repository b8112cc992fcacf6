import { type Signal, type WritableSignal, computed, linkedSignal, signal, untracked } from '@angular/core';
import {
  type AreaPx,
  type ExtentMm,
  MAX_PX_PER_MM,
  MIN_OF_FIT,
  type PointPx,
  type Viewport,
  fitted,
  refitted,
  showing,
  zoomedAbout,
} from './viewport';

/** What a drawing is seen through. While nobody zooms, everything is shown; an edit doesn't make it jump. */
export class ZoomView {
  readonly #refits = signal(0);
  readonly #fit: Signal<Viewport>;
  /** Null: everything is shown. */
  readonly #own: WritableSignal<Viewport | null>;
  readonly viewport: Signal<Viewport>;
  readonly canZoomIn: Signal<boolean>;
  readonly canZoomOut: Signal<boolean>;

  /**
   * @param extent what is drawn
   * @param area the part of the sheet it gets
   * @param zoom scale as a multiple of the one at which everything just fits; the reader's and the page's alike
   */
  constructor(
    private readonly extent: Signal<ExtentMm>,
    private readonly area: Signal<AreaPx>,
    private readonly zoom: WritableSignal<number>,
  ) {
    this.#fit = linkedSignal<{ extent: ExtentMm; area: AreaPx; refits: number }, Viewport>({
      source: () => ({ extent: extent(), area: area(), refits: this.#refits() }),
      computation: (now, before) => {
        const keeps = before?.source.area === now.area && before.source.refits === now.refits;
        return refitted(keeps ? before.value : null, now.extent, now.area);
      },
    });
    this.#own = linkedSignal<number, Viewport | null>({
      source: zoom,
      computation: (asked, before) => untracked(() => this.#asked(asked, before?.value ?? null)),
    });
    this.viewport = computed(() => this.#own() ?? this.#fit());
    this.canZoomIn = computed(() => this.viewport().pxPerMm < MAX_PX_PER_MM * 0.999);
    this.canZoomOut = computed(
      () => this.viewport().pxPerMm > fitted(extent(), area()).pxPerMm * MIN_OF_FIT * 1.001,
    );
  }

  /** Everything in view. */
  fit(): void {
    this.#refits.update((count) => count + 1);
    this.#own.set(null);
    this.zoom.set(1);
  }

  set(viewport: Viewport): void {
    this.#own.set(viewport);
    this.zoom.set(viewport.pxPerMm / fitted(this.extent(), this.area()).pxPerMm);
  }

  /** Enlarged about a point of the sheet; about the middle of the area without one. */
  zoomBy(factor: number, at?: PointPx): void {
    this.set(zoomedAbout(this.viewport(), at ?? this.#middle(), factor, this.extent(), this.area()));
  }

  /** Moved as little as can be so that a range of heights is seen; nothing changes while everything is shown. */
  show(fromMm: number, toMm: number): void {
    if (this.#own() !== null) this.set(showing(this.viewport(), fromMm, toMm, this.area()));
  }

  /** The page asks for a zoom. What was zoomed here comes back the same way and is kept. */
  #asked(zoom: number, own: Viewport | null): Viewport | null {
    const fit = fitted(this.extent(), this.area());
    const now = own ?? fit;
    const factor = (zoom * fit.pxPerMm) / now.pxPerMm;
    if (Math.abs(factor - 1) < 1e-9) return own;
    return zoom === 1 ? null : zoomedAbout(now, this.#middle(), factor, this.extent(), this.area());
  }

  #middle(): PointPx {
    const { leftPx, topPx, widthPx, heightPx } = this.area();
    return { xPx: leftPx + widthPx / 2, yPx: topPx + heightPx / 2 };
  }
}
