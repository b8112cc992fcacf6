/** What a key does on a picture. */
export type PictureKey =
  | { readonly kind: 'point'; readonly byXPx: number; readonly byYPx: number }
  | { readonly kind: 'push'; readonly byXPx: number; readonly byYPx: number }
  | { readonly kind: 'zoom'; readonly factor: number }
  | { readonly kind: 'fit' }
  | { readonly kind: 'middle' }
  | { readonly kind: 'leave' };

/** Factor of one press of plus or minus. */
export const KEY_ZOOM = 1.25;
const POINT_PX = 8;
const PUSH_PX = 60;

const ARROWS: ReadonlyMap<string, readonly [number, number]> = new Map([
  ['ArrowLeft', [-1, 0]],
  ['ArrowRight', [1, 0]],
  ['ArrowUp', [0, -1]],
  ['ArrowDown', [0, 1]],
]);

/** Arrows move the crosshair, with Shift the picture; null for keys that mean nothing here. */
export function pictureKey(
  event: Pick<KeyboardEvent, 'key' | 'shiftKey' | 'altKey' | 'ctrlKey' | 'metaKey'>,
): PictureKey | null {
  if (event.ctrlKey || event.metaKey || event.altKey) return null;
  const arrow = ARROWS.get(event.key);
  if (arrow) {
    const [x, y] = arrow;
    // A window that is pushed to the right shows what was to the right: the picture goes left.
    if (event.shiftKey) return { kind: 'push', byXPx: -x * PUSH_PX, byYPx: -y * PUSH_PX };
    return { kind: 'point', byXPx: x * POINT_PX, byYPx: y * POINT_PX };
  }
  switch (event.key) {
    case '+':
    case '=':
      return { kind: 'zoom', factor: KEY_ZOOM };
    case '-':
    case '_':
      return { kind: 'zoom', factor: 1 / KEY_ZOOM };
    case '0':
      return { kind: 'fit' };
    case 'Home':
      return { kind: 'middle' };
    case 'Escape':
      return { kind: 'leave' };
    default:
      return null;
  }
}
