import type { StackGesture } from './contract';
import { landingPlace } from './landing';
import { NOTHING_SELECTED, type Selection, isSameChoice, movedAlong, only } from './selection';
import { type Press, type StackSheet, chosenOnClick, chosenOnPress } from './stack-press';
import {
  REACH,
  type Reach,
  type StackGeometry,
  type StackHit,
  hitStack,
  layersBetween,
  seamMm,
  thicknessOf,
} from './stack-geometry';
import { type SnappedThickness, snappedThickness } from './thickness-snap';
import { CLICK_PX, type PointerDevice, TAP_PX, type ToolInput, type ToolOutput, isBeyond } from './tool';
import { type PointPx, type Viewport, panned, pinched, toMm } from './viewport';

type Out = ToolOutput<StackGesture, Selection>;

/** What the pointer is doing. Everything of it goes when the gesture ends; nothing of it is in the document. */
export type StackTool =
  | { readonly kind: 'idle' }
  /** Down, and not yet known for what. */
  | { readonly kind: 'pressed'; readonly press: Press }
  /** A finger is down; it may scroll the page, tap, or rest and take something up. */
  | { readonly kind: 'waiting'; readonly press: Press }
  /** Layers are carried. */
  | {
      readonly kind: 'moving';
      readonly pointer: number;
      readonly places: ReadonlySet<number>;
      readonly geometry: StackGeometry;
      readonly before: Selection;
      readonly at: PointPx;
      /** Where they would land; null while they have not been moved. */
      readonly to: number | null;
    }
  /** The upper edge of a layer is drawn. */
  | {
      readonly kind: 'resizing';
      readonly pointer: number;
      readonly place: number;
      readonly geometry: StackGeometry;
      readonly before: Selection;
      readonly thickness: SnappedThickness;
      /** From the edge to where it was taken, mm. */
      readonly offMm: number;
    }
  | {
      readonly kind: 'marquee';
      readonly pointer: number;
      readonly from: PointPx;
      readonly to: PointPx;
      /** What was chosen before, and stays. */
      readonly kept: Selection;
      readonly before: Selection;
    }
  | { readonly kind: 'panning'; readonly pointer: number; readonly at: PointPx }
  | {
      readonly kind: 'pinching';
      readonly pointers: readonly [number, number];
      readonly from: readonly [PointPx, PointPx];
      readonly to: readonly [PointPx, PointPx];
      readonly viewport: Viewport;
    }
  /** Nothing more until this pointer is lifted. */
  | { readonly kind: 'spent'; readonly pointer: number };

export interface StackStep {
  readonly tool: StackTool;
  readonly out: readonly Out[];
}

export const IDLE: StackTool = { kind: 'idle' };

export function reachOf(device: PointerDevice): Reach {
  return device === 'touch' ? REACH.coarse : REACH.fine;
}

/** The layer that shows a grip: the only one chosen. */
export function gripOf(selection: Selection): number | null {
  return selection.places.size === 1 ? ([...selection.places][0] ?? null) : null;
}

/** What lies under a point, names beside the stack included. */
export function hitOn(sheet: StackSheet, at: PointPx, device: PointerDevice): StackHit {
  const hit = hitStack(sheet.geometry, sheet.viewport, at, reachOf(device), gripOf(sheet.selection));
  if (hit.kind !== 'empty') return hit;
  const label = sheet.labelAt(at);
  return label === null ? hit : { kind: 'layer', place: label };
}

/** Whether a gesture that changes the document is under way. */
export function isEditing(tool: StackTool): boolean {
  return tool.kind === 'moving' || tool.kind === 'resizing';
}

/** Whether fingers belong to the drawing now, so that the page must not scroll. */
export function holdsTouch(tool: StackTool): boolean {
  return tool.kind !== 'idle' && tool.kind !== 'waiting' && tool.kind !== 'spent';
}

/** One step of the tool: the same input on the same sheet gives the same step, always. */
export function stackTool(tool: StackTool, input: ToolInput, sheet: StackSheet): StackStep {
  switch (input.kind) {
    case 'press':
      return pressed(tool, input, sheet);
    case 'move':
      return moved(tool, input, sheet);
    case 'release':
      return released(tool, input, sheet);
    case 'hold':
      return tool.kind === 'waiting' && tool.press.pointer === input.pointer
        ? takenUp(tool.press, sheet)
        : stay(tool);
    case 'lost':
      return owns(tool, input.pointer) ? { tool: IDLE, out: abandoned(tool) } : stay(tool);
    case 'abort':
      return tool.kind === 'idle'
        ? stay(tool)
        : { tool: { kind: 'spent', pointer: pointerOf(tool) }, out: abandoned(tool) };
  }
}

function pressed(
  tool: StackTool,
  input: Extract<ToolInput, { kind: 'press' }>,
  sheet: StackSheet,
): StackStep {
  const { pointer, device, at, modifiers } = input;
  const isSecondFinger = device === 'touch' && (tool.kind === 'waiting' || tool.kind === 'pressed');
  if (isSecondFinger && tool.press.pointer !== pointer) {
    const from = [tool.press.at, at] as const;
    return stay({
      kind: 'pinching',
      pointers: [tool.press.pointer, pointer],
      from,
      to: from,
      viewport: sheet.viewport,
    });
  }
  if (tool.kind !== 'idle' && tool.kind !== 'spent') return stay(tool);
  if (input.button === 'other') return stay(tool);
  if (input.button === 'middle') return stay({ kind: 'panning', pointer, at });
  const hit = hitOn(sheet, at, device);
  const wasChosen = hit.kind !== 'empty' && sheet.selection.places.has(hit.place);
  const press: Press = { pointer, device, at, hit, modifiers, wasChosen };
  if (device === 'touch' && hit.kind !== 'grip') return stay({ kind: 'waiting', press });
  return { tool: { kind: 'pressed', press }, out: choosing(chosenOnPress(press, sheet.selection)) };
}

function moved(
  tool: StackTool,
  input: Extract<ToolInput, { kind: 'move' | 'release' }>,
  sheet: StackSheet,
): StackStep {
  if (!owns(tool, input.pointer)) return stay(tool);
  const { at, modifiers } = input;
  switch (tool.kind) {
    case 'pressed':
      return isBeyond(tool.press.at, at, CLICK_PX) ? dragged(tool.press, input, sheet) : stay(tool);
    case 'waiting':
      // The finger scrolls the page.
      return isBeyond(tool.press.at, at, TAP_PX)
        ? stay({ kind: 'spent', pointer: input.pointer })
        : stay(tool);
    case 'moving': {
      const to = landingPlace(tool.geometry, toMm(sheet.viewport, at).upMm);
      if (to === tool.to) return stay({ ...tool, at });
      return {
        tool: { ...tool, at, to },
        out: [
          { kind: 'edit', gesture: { kind: 'move', places: tool.places, to } },
          { kind: 'select', selection: movedAlong(tool.before, to) },
        ],
      };
    }
    case 'resizing': {
      const askedMm = toMm(sheet.viewport, at).upMm - tool.offMm - seamMm(tool.geometry, tool.place);
      const thickness = snappedThickness(
        askedMm,
        sheet.stockMm,
        sheet.viewport.pxPerMm,
        sheet.system,
        modifiers.isFree,
      );
      const { thicknessMm } = thickness;
      const isSame = thicknessMm === tool.thickness.thicknessMm;
      return {
        tool: { ...tool, thickness },
        out: isSame ? [] : [{ kind: 'edit', gesture: { kind: 'thickness', place: tool.place, thicknessMm } }],
      };
    }
    case 'marquee':
      return framed({ ...tool, to: at }, sheet);
    case 'panning': {
      const { xPx, yPx } = tool.at;
      const viewport = panned(sheet.viewport, at.xPx - xPx, at.yPx - yPx, extentOf(sheet), sheet.area);
      return { tool: { ...tool, at }, out: [{ kind: 'view', viewport }] };
    }
    case 'pinching': {
      const to =
        tool.pointers[0] === input.pointer ? ([at, tool.to[1]] as const) : ([tool.to[0], at] as const);
      const viewport = pinched(tool.viewport, tool.from, to, extentOf(sheet), sheet.area);
      return { tool: { ...tool, to }, out: [{ kind: 'view', viewport }] };
    }
    case 'idle':
    case 'spent':
      return stay(tool);
  }
}

function released(
  tool: StackTool,
  input: Extract<ToolInput, { kind: 'move' | 'release' }>,
  sheet: StackSheet,
): StackStep {
  if (!owns(tool, input.pointer)) return stay(tool);
  const last = moved(tool, input, sheet);
  const now = last.tool;
  switch (now.kind) {
    case 'pressed':
    case 'waiting':
      return { tool: IDLE, out: choosing(chosenOnClick(now.press, sheet)) };
    case 'moving':
    case 'resizing':
      return { tool: IDLE, out: [...last.out, { kind: 'end', end: 'settle' }] };
    case 'pinching': {
      const other = now.pointers[0] === input.pointer ? now.pointers[1] : now.pointers[0];
      return { tool: { kind: 'spent', pointer: other }, out: last.out };
    }
    default:
      return { tool: IDLE, out: last.out };
  }
}

/** The pointer moved far enough: from now on it is a drag. */
function dragged(
  press: Press,
  input: Extract<ToolInput, { kind: 'move' | 'release' }>,
  sheet: StackSheet,
): StackStep {
  const { hit, pointer, modifiers } = press;
  const starts: StackStep =
    hit.kind === 'empty'
      ? modifiers.extends || modifiers.toggles
        ? stay({
            kind: 'marquee',
            pointer,
            from: press.at,
            to: press.at,
            kept: modifiers.toggles ? sheet.selection : NOTHING_SELECTED,
            before: sheet.selection,
          })
        : stay({ kind: 'panning', pointer, at: press.at })
      : takenUp(press, sheet);
  const goesOn = moved(starts.tool, input, sheet);
  return { tool: goesOn.tool, out: [...starts.out, ...goesOn.out] };
}

/** Layers or an edge are taken up: the gesture begins. */
function takenUp(press: Press, sheet: StackSheet): StackStep {
  const { hit, pointer, at } = press;
  if (hit.kind === 'empty' || hit.place >= sheet.geometry.count) return stay({ kind: 'spent', pointer });
  if (hit.kind === 'layer') {
    const isChosen = sheet.selection.places.has(hit.place);
    const before = isChosen ? sheet.selection : only(hit.place);
    return {
      tool: {
        kind: 'moving',
        pointer,
        places: before.places,
        geometry: sheet.geometry,
        before,
        at,
        to: null,
      },
      out: [...(isChosen ? [] : [{ kind: 'select', selection: before } as const]), { kind: 'start' }],
    };
  }
  const before = only(hit.place);
  const edgeMm = seamMm(sheet.geometry, hit.place + 1);
  const thicknessMm = thicknessOf(sheet.geometry, hit.place);
  const isChosen = isSameChoice(sheet.selection.places, before.places);
  return {
    tool: {
      kind: 'resizing',
      pointer,
      place: hit.place,
      geometry: sheet.geometry,
      before,
      thickness: { thicknessMm, stockMm: null },
      offMm: toMm(sheet.viewport, at).upMm - edgeMm,
    },
    out: [...(isChosen ? [] : [{ kind: 'select', selection: before } as const]), { kind: 'start' }],
  };
}

function framed(tool: Extract<StackTool, { kind: 'marquee' }>, sheet: StackSheet): StackStep {
  const a = toMm(sheet.viewport, tool.from);
  const b = toMm(sheet.viewport, tool.to);
  const { widthMm } = sheet.geometry;
  const isBeside = Math.max(a.acrossMm, b.acrossMm) < 0 || Math.min(a.acrossMm, b.acrossMm) > widthMm;
  const framedPlaces = isBeside ? new Set<number>() : layersBetween(sheet.geometry, a.upMm, b.upMm);
  const places = new Set([...tool.kept.places, ...framedPlaces]);
  if (isSameChoice(places, sheet.selection.places)) return stay(tool);
  const ends = [...framedPlaces];
  const selection: Selection = {
    places,
    anchor: ends[0] ?? tool.kept.anchor,
    cursor: ends[ends.length - 1] ?? tool.kept.cursor,
  };
  return { tool, out: [{ kind: 'select', selection }] };
}

/** What puts everything back as it was when the gesture began. */
function abandoned(tool: StackTool): readonly Out[] {
  switch (tool.kind) {
    case 'moving':
    case 'resizing':
      return [
        { kind: 'end', end: 'abort' },
        { kind: 'select', selection: tool.before },
      ];
    case 'marquee':
      return [{ kind: 'select', selection: tool.before }];
    default:
      return [];
  }
}

function choosing(selection: Selection | null): readonly Out[] {
  return selection === null ? [] : [{ kind: 'select', selection }];
}

function extentOf(sheet: StackSheet): { acrossMm: number; upMm: number } {
  return { acrossMm: sheet.geometry.widthMm, upMm: sheet.geometry.heightMm };
}

function owns(tool: StackTool, pointer: number): boolean {
  if (tool.kind === 'idle') return false;
  return tool.kind === 'pinching' ? tool.pointers.includes(pointer) : pointerOf(tool) === pointer;
}

function pointerOf(tool: Exclude<StackTool, { kind: 'idle' }>): number {
  if (tool.kind === 'pressed' || tool.kind === 'waiting') return tool.press.pointer;
  return tool.kind === 'pinching' ? tool.pointers[0] : tool.pointer;
}

function stay(tool: StackTool): StackStep {
  return { tool, out: [] };
}
