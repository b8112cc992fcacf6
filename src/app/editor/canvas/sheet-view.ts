import {
  DestroyRef,
  type ElementRef,
  type Signal,
  afterNextRender,
  effect,
  inject,
  signal,
  untracked,
} from '@angular/core';
import { type Drawing, Sheet } from './sheet';

/** Size of a sheet as it is laid out, CSS px. */
export interface SheetSize {
  readonly widthPx: number;
  readonly heightPx: number;
  /** Device pixels for each CSS pixel. */
  readonly pixelRatio: number;
}

/** Before the first layout. */
const NO_SIZE: SheetSize = { widthPx: 0, heightPx: 0, pixelRatio: 1 };

/**
 * Keeps a sheet in an element for as long as the caller lives: it follows the element's size and the screen's pixel
 * ratio, and shows what `drawings` gives whenever that changes. Call it where `inject` may be called.
 */
export function sheetIn(
  container: Signal<ElementRef<HTMLDivElement>>,
  drawings: (size: SheetSize) => readonly Drawing[],
): Signal<SheetSize> {
  const size = signal(NO_SIZE);
  const sheet = signal<Sheet | null>(null);
  const destroyRef = inject(DestroyRef);

  afterNextRender(() => {
    const { nativeElement: element } = container();
    const measure = (): void => {
      const next = {
        widthPx: element.clientWidth,
        heightPx: element.clientHeight,
        pixelRatio: Math.max(1, devicePixelRatio),
      };
      const now = untracked(size);
      const isSame = (Object.keys(next) as (keyof SheetSize)[]).every((key) => next[key] === now[key]);
      if (!isSame) size.set(next);
    };
    measure();
    const made = new Sheet(element);
    sheet.set(made);
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    const stopRatio = onPixelRatio(measure);
    destroyRef.onDestroy(() => {
      observer.disconnect();
      stopRatio();
      made.destroy();
    });
  });

  effect(() => {
    const made = sheet();
    const now = size();
    if (made === null || now.widthPx === 0 || now.heightPx === 0) return;
    made.render(now.widthPx, now.heightPx, now.pixelRatio, drawings(now));
  });

  return size.asReadonly();
}

/** Calls back when the page is zoomed or goes to another screen. */
function onPixelRatio(changed: () => void): () => void {
  let query = matchMedia(`(resolution: ${devicePixelRatio}dppx)`);
  const again = (): void => {
    query.removeEventListener('change', again);
    query = matchMedia(`(resolution: ${devicePixelRatio}dppx)`);
    query.addEventListener('change', again);
    changed();
  };
  query.addEventListener('change', again);
  return () => query.removeEventListener('change', again);
}
