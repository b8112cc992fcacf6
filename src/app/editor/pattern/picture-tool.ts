import { CLICK_PX, type PointerDevice, TAP_PX, type ToolInput, isBeyond } from '../canvas/tool';
import { type AreaPx, type ExtentMm, type PointPx, type Viewport, panned, pinched } from '../canvas/viewport';

interface Finger {
  readonly pointer: number;
  readonly at: PointPx;
}

/** What pointers are doing on a picture. */
export type PictureTool =
  | { readonly kind: 'idle' }
  | { readonly kind: 'pressed'; readonly finger: Finger; readonly device: PointerDevice }
  | { readonly kind: 'panning'; readonly finger: Finger }
  | { readonly kind: 'pinching'; readonly fingers: readonly [Finger, Finger] };

export const IDLE_TOOL: PictureTool = { kind: 'idle' };

/** What the picture is seen through. */
export interface Sight {
  readonly viewport: Viewport;
  readonly extent: ExtentMm;
  readonly area: AreaPx;
}

/** What comes of an input. */
export interface ToolResult {
  readonly tool: PictureTool;
  /** The view that the gesture made. */
  readonly viewport?: Viewport;
  /** A place that was clicked or tapped. */
  readonly point?: PointPx;
}

/** A mouse drags the picture; one finger scrolls the page, two push and pinch; a click or a tap points at a place. */
export function pictureTool(tool: PictureTool, input: ToolInput, sight: Sight): ToolResult {
  switch (input.kind) {
    case 'press':
      if (input.button === 'other') return { tool };
      return { tool: pressed(tool, { pointer: input.pointer, at: input.at }, input.device) };
    case 'move':
      return moved(tool, { pointer: input.pointer, at: input.at }, sight);
    case 'release':
      if (tool.kind === 'pressed' && tool.finger.pointer === input.pointer) {
        return { tool: IDLE_TOOL, point: input.at };
      }
      return { tool: holds(tool, input.pointer) ? IDLE_TOOL : tool };
    case 'lost':
      return { tool: holds(tool, input.pointer) ? IDLE_TOOL : tool };
    case 'abort':
      return { tool: IDLE_TOOL };
    case 'hold':
      return { tool };
  }
}

function pressed(tool: PictureTool, finger: Finger, device: PointerDevice): PictureTool {
  if (tool.kind === 'idle') return { kind: 'pressed', finger, device };
  if (tool.kind === 'pressed' && device === 'touch' && tool.device === 'touch') {
    return { kind: 'pinching', fingers: [tool.finger, finger] };
  }
  return tool;
}

function moved(tool: PictureTool, finger: Finger, { viewport, extent, area }: Sight): ToolResult {
  switch (tool.kind) {
    case 'idle':
      return { tool };
    case 'pressed': {
      if (tool.finger.pointer !== finger.pointer) return { tool };
      const reachPx = tool.device === 'touch' ? TAP_PX : CLICK_PX;
      if (!isBeyond(tool.finger.at, finger.at, reachPx)) return { tool };
      // A finger that moves scrolls the page: it points at nothing.
      if (tool.device === 'touch') return { tool: IDLE_TOOL };
      return moved({ kind: 'panning', finger: tool.finger }, finger, { viewport, extent, area });
    }
    case 'panning': {
      if (tool.finger.pointer !== finger.pointer) return { tool };
      const { at } = tool.finger;
      return {
        tool: { kind: 'panning', finger },
        viewport: panned(viewport, finger.at.xPx - at.xPx, finger.at.yPx - at.yPx, extent, area),
      };
    }
    case 'pinching': {
      const [a, b] = tool.fingers;
      const fingers: readonly [Finger, Finger] = [
        a.pointer === finger.pointer ? finger : a,
        b.pointer === finger.pointer ? finger : b,
      ];
      return {
        tool: { kind: 'pinching', fingers },
        viewport: pinched(viewport, [a.at, b.at], [fingers[0].at, fingers[1].at], extent, area),
      };
    }
  }
}

function holds(tool: PictureTool, pointer: number): boolean {
  switch (tool.kind) {
    case 'idle':
      return false;
    case 'pinching':
      return tool.fingers.some((finger) => finger.pointer === pointer);
    default:
      return tool.finger.pointer === pointer;
  }
}
