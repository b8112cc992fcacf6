import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import type { Design } from '@shared/design';
import { type Moment, PLAIN_LOOK, type Surface, surfaceMap } from '@shared/pattern';
import type { PicturePart } from './messages';
import { ThumbShelf } from './thumb-shelf';

/** Samples at the borders of layers. */
const SAMPLES = 16;
/** Ground off a face to show its pattern, as a part of the thickness, and at most, mm. Common practice, no source. */
const GROUND_SHARE = 0.15;
const GROUND_MM = 1;

/**
 * A small etched picture of a design, made when it comes into sight: of the blade where the design says one and no
 * moment is named, else of the top face, a little ground. As wide as its place, or as told.
 */
@Component({
  selector: 'lw-pattern-thumb',
  template: '<canvas #canvas aria-hidden="true"></canvas>',
  styles: `
    :host {
      display: block;
      line-height: 0;
    }

    canvas {
      display: block;
      width: 100%;
      height: 100%;
    }
  `,
  host: {
    '[attr.role]': 'text() ? "img" : null',
    '[attr.aria-label]': 'text() || null',
    '[attr.aria-hidden]': 'text() ? null : true',
    '[style.aspect-ratio]': 'proportion()',
    '[style.width.px]': 'widthPx()',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PatternThumb {
  readonly design = input.required<Design>();
  /** Size of the bar that is shown, mm. */
  readonly bar = input.required<{
    readonly lengthMm: number;
    readonly widthMm: number;
    readonly thicknessMm: number;
  }>();
  /** The bar and state; absent: the result as it is in the end. */
  readonly at = input<Moment>();
  /** What of it is shown; absent: see above. */
  readonly surface = input<Surface>();
  /** While this is the same object, so is the bar: spares new pictures of what an edit left alone. */
  readonly like = input<object>();
  /** Width, CSS px; absent: as wide as its place. */
  readonly widthPx = input<number>();
  /** What is shown, in words; absent: it is said beside the picture already. */
  readonly text = input<string>();

  private readonly shelf = inject(ThumbShelf);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('canvas');
  /** Width in device pixels; 0 while it is out of sight. */
  private readonly seenPx = signal(0);

  private readonly shown = computed<Surface>(() => {
    const { blank } = this.design();
    const surface = this.surface();
    if (surface) return surface;
    if (blank && !this.at()) return { kind: 'blade', side: 'left' };
    const depthMm = Math.min(GROUND_MM, GROUND_SHARE * this.bar().thicknessMm);
    return { kind: 'face', face: 'top', depthMm };
  });
  private readonly extent = computed(() => surfaceMap(this.shown(), this.bar(), this.design().blank));
  protected readonly proportion = computed(() => `${this.extent().widthMm} / ${this.extent().heightMm}`);

  constructor() {
    const destroyRef = inject(DestroyRef);
    afterNextRender(() => {
      const { nativeElement } = this.host;
      const measure = (): void =>
        this.seenPx.set(Math.round(nativeElement.clientWidth * Math.min(2, Math.max(1, devicePixelRatio))));
      let isSeen = false;
      const sight = new IntersectionObserver(
        (entries) => {
          isSeen ||= entries.some((entry) => entry.isIntersecting);
          if (!isSeen) return;
          sight.disconnect();
          measure();
        },
        { rootMargin: '200px' },
      );
      const size = new ResizeObserver(() => isSeen && measure());
      sight.observe(nativeElement);
      size.observe(nativeElement);
      destroyRef.onDestroy(() => {
        sight.disconnect();
        size.disconnect();
      });
    });
    effect((onCleanup) => {
      const widthPx = this.seenPx();
      if (widthPx === 0) return;
      const { widthMm, heightMm } = this.extent();
      const heightPx = Math.max(1, Math.round((widthPx * heightMm) / widthMm));
      const design = this.design();
      const order = { design, at: this.at(), surface: this.shown(), widthPx, heightPx };
      const like = this.like() ?? design;
      const subscription = untracked(() =>
        this.shelf
          .picture({ ...order, samples: SAMPLES, look: PLAIN_LOOK }, like)
          // Where there is no picture, there is an empty place of its size; what is wrong is said where it can be seen to.
          .subscribe({ next: (part) => this.draw(part), error: () => undefined }),
      );
      onCleanup(() => subscription.unsubscribe());
    });
  }

  private draw({ pixels, widthPx, heightPx }: PicturePart): void {
    const canvas = this.canvas().nativeElement;
    canvas.width = widthPx;
    canvas.height = heightPx;
    canvas.getContext('2d')?.putImageData(new ImageData(pixels, widthPx, heightPx), 0, 0);
  }
}
