import { HOLD_MS, type Modifiers, type PointerDevice, type ToolInput } from './tool';
import type { PointPx } from './viewport';

/** What a drawing does with what happens on it. */
export interface SheetHandlers {
  readonly input: (input: ToolInput) => void;
  /** A pointer passes over without being down; null: it left. */
  readonly hover: (at: PointPx | null, device: PointerDevice) => void;
  /** The wheel, and a pinch on a touchpad; without it they scroll the page. */
  readonly zoom?: (at: PointPx, factor: number) => void;
  readonly push?: (byXPx: number, byYPx: number) => void;
  /** @returns whether the key was used */
  readonly key: (event: KeyboardEvent) => boolean;
  /** Whether a pointer is at work. */
  readonly isBusy: () => boolean;
  /** Whether fingers belong to the drawing now, so that the page must not scroll. */
  readonly holdsTouch: () => boolean;
  /** Type of the data that may be dropped here. */
  readonly dropType: string;
  /** Something droppable is over a point; null: no longer. */
  readonly dropOver: (at: PointPx | null) => void;
  readonly drop: (at: PointPx, data: string) => void;
}

const NO_MODIFIERS: Modifiers = { extends: false, toggles: false, isFree: false };

/**
 * Turns a browser's events on an element into what a tool understands, until `signal` stops it. Listens by itself, not
 * through the template: what moves must not check the page for changes, and what is the drawing's must not scroll it.
 */
export function listenOn(element: HTMLElement, handlers: SheetHandlers, signal: AbortSignal): void {
  const on = <K extends keyof HTMLElementEventMap>(
    name: K,
    handle: (event: HTMLElementEventMap[K]) => void,
  ): void => element.addEventListener(name, handle, { signal, passive: false });

  let holdTimer: ReturnType<typeof setTimeout> | undefined;
  /** The last move of a pointer that is down: a key may change what it means. */
  let last: { pointer: number; at: PointPx } | null = null;

  on('pointerdown', (event) => {
    element.setPointerCapture(event.pointerId);
    const press = pressOf(element, event);
    last = { pointer: event.pointerId, at: press.at };
    handlers.input(press);
    clearTimeout(holdTimer);
    if (press.device === 'touch') {
      holdTimer = setTimeout(() => handlers.input({ kind: 'hold', pointer: press.pointer }), HOLD_MS);
    }
  });
  on('mousedown', (event) => {
    // Else the middle button starts scrolling by itself. The main button keeps what it does: it gives the focus.
    if (event.button === 1) event.preventDefault();
  });
  on('pointermove', (event) => {
    const at = pointOn(element, event);
    if (!handlers.isBusy()) {
      if (event.pointerType !== 'touch') handlers.hover(at, deviceOf(event));
      return;
    }
    last = { pointer: event.pointerId, at };
    handlers.input({ kind: 'move', pointer: event.pointerId, at, modifiers: modifiersOf(event) });
  });
  on('pointerup', (event) => {
    const at = pointOn(element, event);
    handlers.input({ kind: 'release', pointer: event.pointerId, at, modifiers: modifiersOf(event) });
    last = null;
    if (event.pointerType !== 'touch') handlers.hover(at, deviceOf(event));
  });
  on('pointercancel', (event) => handlers.input({ kind: 'lost', pointer: event.pointerId }));
  on('pointerleave', (event) => handlers.hover(null, deviceOf(event)));
  on('contextmenu', (event) => {
    // A finger that rests takes something up; there is no menu to it.
    if (handlers.isBusy()) event.preventDefault();
  });
  for (const name of ['touchstart', 'touchmove'] as const) {
    on(name, (event) => {
      if (handlers.holdsTouch() && event.cancelable) event.preventDefault();
    });
  }
  const { zoom, push } = handlers;
  if (zoom && push) {
    on('wheel', (event) => {
      event.preventDefault();
      if (event.shiftKey && !event.ctrlKey) push(-(event.deltaX || event.deltaY), 0);
      else zoom(pointOn(element, event), wheelFactor(event));
    });
  }
  on('keydown', (event) => {
    if (!handlers.isBusy() && handlers.key(event)) event.preventDefault();
  });

  const carriesOurs = (event: DragEvent): boolean =>
    event.dataTransfer?.types.includes(handlers.dropType) === true;
  for (const name of ['dragenter', 'dragover'] as const) {
    on(name, (event) => {
      if (!carriesOurs(event)) return;
      event.preventDefault();
      if (event.dataTransfer) event.dataTransfer.dropEffect = 'copy';
      handlers.dropOver(pointOn(element, event));
    });
  }
  on('dragleave', (event) => {
    // Konva's canvases are inside: only what leaves the sheet itself has left.
    if (!(event.relatedTarget instanceof Node && element.contains(event.relatedTarget)))
      handlers.dropOver(null);
  });
  on('drop', (event) => {
    if (!carriesOurs(event)) return;
    event.preventDefault();
    handlers.dropOver(null);
    const data = event.dataTransfer?.getData(handlers.dropType) ?? '';
    if (data !== '') handlers.drop(pointOn(element, event), data);
  });

  const anywhere = (event: KeyboardEvent): void => {
    if (!handlers.isBusy()) return;
    const isUndo = (event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 'z';
    if (event.type === 'keydown' && (event.key === 'Escape' || isUndo)) {
      // What is undone in the middle of a gesture is the gesture, and nothing besides.
      event.preventDefault();
      event.stopPropagation();
      handlers.input({ kind: 'abort' });
    } else if (event.key === 'Alt' && last) {
      event.preventDefault();
      handlers.input({ kind: 'move', ...last, modifiers: { ...NO_MODIFIERS, isFree: event.altKey } });
    }
  };
  document.addEventListener('keydown', anywhere, { signal, capture: true });
  document.addEventListener('keyup', anywhere, { signal, capture: true });
  signal.addEventListener('abort', () => clearTimeout(holdTimer));
}

function pointOn(element: Element, event: { clientX: number; clientY: number }): PointPx {
  const box = element.getBoundingClientRect();
  return { xPx: event.clientX - box.left, yPx: event.clientY - box.top };
}

function modifiersOf(event: MouseEvent): Modifiers {
  return { extends: event.shiftKey, toggles: event.ctrlKey || event.metaKey, isFree: event.altKey };
}

function deviceOf(event: PointerEvent): PointerDevice {
  return event.pointerType === 'touch' || event.pointerType === 'pen' ? event.pointerType : 'mouse';
}

function pressOf(element: Element, event: PointerEvent): Extract<ToolInput, { kind: 'press' }> {
  return {
    kind: 'press',
    pointer: event.pointerId,
    device: deviceOf(event),
    button: event.button === 0 ? 'main' : event.button === 1 ? 'middle' : 'other',
    at: pointOn(element, event),
    modifiers: modifiersOf(event),
  };
}

/**
 * The factor that a turn of the wheel or a pinch on a touchpad zooms by: a notch of a usual wheel is 100 px and gives
 * 1.22; a pinch comes in small steps with Ctrl set.
 */
export function wheelFactor(event: Pick<WheelEvent, 'deltaY' | 'deltaMode' | 'ctrlKey'>): number {
  const linePx = 33;
  const deltaPx = event.deltaMode === 0 ? event.deltaY : event.deltaY * linePx;
  const limitedPx = Math.min(200, Math.max(-200, deltaPx));
  return Math.exp(-limitedPx * (event.ctrlKey ? 0.01 : 0.002));
}
