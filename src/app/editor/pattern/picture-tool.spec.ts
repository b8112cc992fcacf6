import type { Modifiers, ToolInput } from '../canvas/tool';
import { pictureKey } from './picture-keys';
import { IDLE_TOOL, type PictureTool, type Sight, type ToolResult, pictureTool } from './picture-tool';

const NONE: Modifiers = { extends: false, toggles: false, isFree: false };
const SIGHT: Sight = {
  viewport: { pxPerMm: 3, originPx: { xPx: 10, yPx: 200 } },
  extent: { acrossMm: 280, upMm: 42 },
  area: { leftPx: 0, topPx: 0, widthPx: 900, heightPx: 300 },
};

function press(pointer: number, xPx: number, yPx: number, device: 'mouse' | 'touch' = 'mouse'): ToolInput {
  return { kind: 'press', pointer, device, button: 'main', at: { xPx, yPx }, modifiers: NONE };
}
function to(kind: 'move' | 'release', pointer: number, xPx: number, yPx: number): ToolInput {
  return { kind, pointer, at: { xPx, yPx }, modifiers: NONE };
}

/** Plays inputs, each seen through what the one before made. */
function played(...inputs: readonly ToolInput[]): ToolResult & { readonly sight: Sight } {
  let tool: PictureTool = IDLE_TOOL;
  let sight = SIGHT;
  let result: ToolResult = { tool };
  for (const input of inputs) {
    result = pictureTool(tool, input, sight);
    tool = result.tool;
    if (result.viewport) sight = { ...sight, viewport: result.viewport };
  }
  return { ...result, sight };
}

describe('pictureTool', () => {
  it('points at what is clicked, though the hand shook', () => {
    const { point, tool } = played(press(1, 50, 60), to('move', 1, 52, 61), to('release', 1, 52, 61));
    expect(point).toEqual({ xPx: 52, yPx: 61 });
    expect(tool).toEqual(IDLE_TOOL);
  });

  it('is pushed by a mouse and points at nothing then', () => {
    const { sight, point } = played(press(1, 50, 60), to('move', 1, 90, 50), to('release', 1, 90, 50));
    expect(sight.viewport).toEqual({ pxPerMm: 3, originPx: { xPx: 50, yPx: 190 } });
    expect(point).toBeUndefined();
  });

  it('leaves one finger to the page, and a tap to the probe', () => {
    const scrolled = played(press(1, 50, 60, 'touch'), to('move', 1, 50, 90));
    expect(scrolled.tool).toEqual(IDLE_TOOL);
    expect(scrolled.sight.viewport).toEqual(SIGHT.viewport);
    expect(played(press(1, 50, 60, 'touch'), to('release', 1, 55, 62)).point).toEqual({ xPx: 55, yPx: 62 });
  });

  it('keeps under two fingers what lay under them', () => {
    const { sight, tool } = played(
      press(1, 100, 100, 'touch'),
      press(2, 200, 100, 'touch'),
      to('move', 2, 300, 100),
    );
    expect(tool.kind).toBe('pinching');
    expect(sight.viewport.pxPerMm).toBeCloseTo(6, 9);
    // 30 mm along lay under the first finger.
    expect(sight.viewport.originPx.xPx + 30 * sight.viewport.pxPerMm).toBeCloseTo(100, 9);
    expect(played(press(1, 0, 0, 'touch'), press(2, 9, 9, 'touch'), to('release', 1, 0, 0)).tool).toEqual(
      IDLE_TOOL,
    );
  });

  it('stops when the browser takes the pointer, and at Escape', () => {
    expect(played(press(1, 50, 60), { kind: 'lost', pointer: 1 }).tool).toEqual(IDLE_TOOL);
    expect(played(press(1, 50, 60), to('move', 1, 90, 50), { kind: 'abort' }).tool).toEqual(IDLE_TOOL);
    expect(played(press(1, 50, 60), to('move', 1, 90, 50), { kind: 'lost', pointer: 2 }).tool.kind).toBe(
      'panning',
    );
  });
});

describe('pictureKey', () => {
  const key = (name: string, held: object = {}): ReturnType<typeof pictureKey> =>
    pictureKey({ key: name, shiftKey: false, altKey: false, ctrlKey: false, metaKey: false, ...held });

  it('moves the crosshair by arrows, the picture with Shift, zooms and fits', () => {
    expect(key('ArrowLeft')).toEqual({ kind: 'point', byXPx: -8, byYPx: 0 });
    expect(key('ArrowDown')).toEqual({ kind: 'point', byXPx: 0, byYPx: 8 });
    expect(key('ArrowRight', { shiftKey: true })).toEqual({ kind: 'push', byXPx: -60, byYPx: -0 });
    expect(key('+')).toEqual({ kind: 'zoom', factor: 1.25 });
    expect(key('-')).toEqual({ kind: 'zoom', factor: 0.8 });
    expect(key('0')).toEqual({ kind: 'fit' });
    expect(key('Home')).toEqual({ kind: 'middle' });
    expect(key('Escape')).toEqual({ kind: 'leave' });
  });

  it('leaves the browser’s keys alone', () => {
    expect(key('ArrowLeft', { altKey: true })).toBeNull();
    expect(key('0', { ctrlKey: true })).toBeNull();
    expect(key('Tab')).toBeNull();
  });
});
