import {
  DestroyRef,
  type ElementRef,
  type Signal,
  afterNextRender,
  inject,
  signal,
  untracked,
} from '@angular/core';

/** Size of an element as it is laid out, CSS px. */
export interface ElementSize {
  readonly widthPx: number;
  readonly heightPx: number;
  /** Device pixels for each CSS pixel. */
  readonly pixelRatio: number;
}

/** The size of an element for as long as the caller lives; nothing before the first layout. */
export function elementSize(element: Signal<ElementRef<HTMLElement>>): Signal<ElementSize> {
  const size = signal<ElementSize>({ widthPx: 0, heightPx: 0, pixelRatio: 1 });
  const destroyRef = inject(DestroyRef);
  afterNextRender(() => {
    const { nativeElement } = element();
    const measure = (): void => {
      const { clientWidth, clientHeight } = nativeElement;
      const pixelRatio = Math.max(1, devicePixelRatio);
      const now = untracked(size);
      const isSame =
        now.widthPx === clientWidth && now.heightPx === clientHeight && now.pixelRatio === pixelRatio;
      if (!isSame) size.set({ widthPx: clientWidth, heightPx: clientHeight, pixelRatio });
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(nativeElement);
    // Another pixel ratio comes with another width in CSS pixels, or with a new window: both are sizes.
    addEventListener('resize', measure);
    destroyRef.onDestroy(() => {
      observer.disconnect();
      removeEventListener('resize', measure);
    });
  });
  return size.asReadonly();
}
