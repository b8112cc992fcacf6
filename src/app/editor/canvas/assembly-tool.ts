import type { Piece } from '@shared/design';
import {
  type AssemblyGeometry,
  type AssemblyHit,
  hitAssembly,
  pieceLanding,
  quarterTurns,
  quartersBetween,
} from './assembly-geometry';
import type { AssemblyGesture } from './contract';
import { CLICK_PX, type PointerDevice, TAP_PX, type ToolInput, type ToolOutput, isBeyond } from './tool';
import { type PointPx, type Viewport, toMm, toPx } from './viewport';

/** The drawing as it is now: what the tool acts on, and never changes. */
export interface AssemblySheet {
  readonly geometry: AssemblyGeometry;
  readonly viewport: Viewport;
  readonly pieces: readonly Piece[];
  /** Place of the chosen piece. */
  readonly chosen: number | null;
  /** The piece whose name is written at a point beside the section, or null. */
  readonly labelAt: (at: PointPx) => number | null;
}

type Out = ToolOutput<AssemblyGesture, number | null>;

interface Press {
  readonly pointer: number;
  readonly at: PointPx;
  readonly hit: AssemblyHit;
}

/** What the pointer is doing. */
export type AssemblyTool =
  | { readonly kind: 'idle' }
  | { readonly kind: 'pressed'; readonly press: Press }
  /** A finger is down; it may scroll the page, tap, or rest and take something up. */
  | { readonly kind: 'waiting'; readonly press: Press }
  | {
      readonly kind: 'moving';
      readonly pointer: number;
      readonly place: number;
      readonly geometry: AssemblyGeometry;
      readonly at: PointPx;
      /** Where it would land; null while it has not been moved. */
      readonly to: number | null;
    }
  | {
      readonly kind: 'turning';
      readonly pointer: number;
      readonly place: number;
      /** About what it turns, and where it was taken. */
      readonly middle: PointPx;
      readonly from: PointPx;
      /** How it lay when the gesture began, and how it lies now. */
      readonly before: 0 | 1 | 2 | 3;
      readonly now: 0 | 1 | 2 | 3;
    }
  | { readonly kind: 'spent'; readonly pointer: number };

export interface AssemblyStep {
  readonly tool: AssemblyTool;
  readonly out: readonly Out[];
}

export const IDLE_ASSEMBLY: AssemblyTool = { kind: 'idle' };

export function isAssembling(tool: AssemblyTool): boolean {
  return tool.kind === 'moving' || tool.kind === 'turning';
}

/** Whether fingers belong to the drawing now, so that the page must not scroll. */
export function assemblyHoldsTouch(tool: AssemblyTool): boolean {
  return tool.kind === 'pressed' || isAssembling(tool);
}

/** What lies under a point, names beside the section included. */
export function hitOnAssembly(sheet: AssemblySheet, at: PointPx, device: PointerDevice): AssemblyHit {
  const exactness = device === 'touch' ? 'coarse' : 'fine';
  const hit = hitAssembly(sheet.geometry, sheet.viewport, at, exactness, sheet.chosen);
  if (hit.kind !== 'empty') return hit;
  const label = sheet.labelAt(at);
  return label === null ? hit : { kind: 'piece', place: label };
}

/** The place that a piece has after it was put before `to`. */
export function placeAfterMove(place: number, to: number): number {
  return to > place ? to - 1 : to;
}

/** One step of the tool: the same input on the same sheet gives the same step, always. */
export function assemblyTool(tool: AssemblyTool, input: ToolInput, sheet: AssemblySheet): AssemblyStep {
  switch (input.kind) {
    case 'press':
      return pressed(tool, input, sheet);
    case 'move':
      return moved(tool, input.pointer, input.at, sheet);
    case 'release':
      return released(tool, input.pointer, input.at, sheet);
    case 'hold':
      return tool.kind === 'waiting' && tool.press.pointer === input.pointer
        ? takenUp(tool.press, sheet)
        : stay(tool);
    case 'lost':
      return pointerOf(tool) === input.pointer ? { tool: IDLE_ASSEMBLY, out: abandoned(tool) } : stay(tool);
    case 'abort': {
      const pointer = pointerOf(tool);
      return pointer === null ? stay(tool) : { tool: { kind: 'spent', pointer }, out: abandoned(tool) };
    }
  }
}

function pressed(
  tool: AssemblyTool,
  input: Extract<ToolInput, { kind: 'press' }>,
  sheet: AssemblySheet,
): AssemblyStep {
  if ((tool.kind !== 'idle' && tool.kind !== 'spent') || input.button !== 'main') return stay(tool);
  const { pointer, at, device } = input;
  const hit = hitOnAssembly(sheet, at, device);
  const press: Press = { pointer, at, hit };
  if (device === 'touch' && hit.kind !== 'handle') return stay({ kind: 'waiting', press });
  return {
    tool: { kind: 'pressed', press },
    out: hit.kind === 'piece' ? choosing(hit.place, sheet) : [],
  };
}

function moved(tool: AssemblyTool, pointer: number, at: PointPx, sheet: AssemblySheet): AssemblyStep {
  if (pointerOf(tool) !== pointer) return stay(tool);
  switch (tool.kind) {
    case 'pressed': {
      if (!isBeyond(tool.press.at, at, CLICK_PX)) return stay(tool);
      const begun = takenUp(tool.press, sheet);
      const goesOn = moved(begun.tool, pointer, at, sheet);
      return { tool: goesOn.tool, out: [...begun.out, ...goesOn.out] };
    }
    case 'waiting':
      return isBeyond(tool.press.at, at, TAP_PX) ? stay({ kind: 'spent', pointer }) : stay(tool);
    case 'moving': {
      const to = pieceLanding(tool.geometry, toMm(sheet.viewport, at));
      if (to === tool.to) return stay({ ...tool, at });
      return {
        tool: { ...tool, at, to },
        out: [
          { kind: 'edit', gesture: { kind: 'move', place: tool.place, to } },
          { kind: 'select', selection: placeAfterMove(tool.place, to) },
        ],
      };
    }
    case 'turning': {
      const now = quarterTurns(tool.before + quartersBetween(tool.middle, tool.from, at));
      if (now === tool.now) return stay(tool);
      return {
        tool: { ...tool, now },
        out: [{ kind: 'edit', gesture: { kind: 'turn', place: tool.place, quarterTurns: now } }],
      };
    }
    case 'idle':
    case 'spent':
      return stay(tool);
  }
}

function released(tool: AssemblyTool, pointer: number, at: PointPx, sheet: AssemblySheet): AssemblyStep {
  if (pointerOf(tool) !== pointer) return stay(tool);
  const last = moved(tool, pointer, at, sheet);
  if (isAssembling(last.tool)) {
    return { tool: IDLE_ASSEMBLY, out: [...last.out, { kind: 'end', end: 'settle' }] };
  }
  if (last.tool.kind === 'pressed' || last.tool.kind === 'waiting') {
    const { hit } = last.tool.press;
    if (hit.kind === 'handle') return { tool: IDLE_ASSEMBLY, out: turnedOnce(hit.place, sheet) };
    return { tool: IDLE_ASSEMBLY, out: choosing(hit.kind === 'piece' ? hit.place : null, sheet) };
  }
  return { tool: IDLE_ASSEMBLY, out: last.out };
}

/** A click on the handle turns the piece by a quarter. */
function turnedOnce(place: number, sheet: AssemblySheet): readonly Out[] {
  const turns = quarterTurns((sheet.pieces[place]?.quarterTurns ?? 0) + 1);
  return [
    { kind: 'start' },
    { kind: 'edit', gesture: { kind: 'turn', place, quarterTurns: turns } },
    { kind: 'end', end: 'settle' },
  ];
}

/** A piece, or its handle, is taken up: the gesture begins. */
function takenUp(press: Press, sheet: AssemblySheet): AssemblyStep {
  const { hit, pointer, at } = press;
  const box = hit.kind === 'empty' ? undefined : sheet.geometry.boxes[hit.place];
  if (hit.kind === 'empty' || box === undefined) return stay({ kind: 'spent', pointer });
  if (hit.kind === 'piece') {
    return {
      tool: { kind: 'moving', pointer, place: hit.place, geometry: sheet.geometry, at, to: null },
      out: [...choosing(hit.place, sheet), { kind: 'start' }],
    };
  }
  const middle = toPx(sheet.viewport, {
    acrossMm: box.acrossMm + box.widthMm / 2,
    upMm: box.upMm + box.heightMm / 2,
  });
  const before = sheet.pieces[hit.place]?.quarterTurns ?? 0;
  return {
    tool: { kind: 'turning', pointer, place: hit.place, middle, from: at, before, now: before },
    out: [{ kind: 'start' }],
  };
}

/** What puts everything back as it was when the gesture began. */
function abandoned(tool: AssemblyTool): readonly Out[] {
  if (!isAssembling(tool) || !('place' in tool)) return [];
  return [
    { kind: 'end', end: 'abort' },
    { kind: 'select', selection: tool.place },
  ];
}

function choosing(place: number | null, sheet: AssemblySheet): readonly Out[] {
  return place === sheet.chosen ? [] : [{ kind: 'select', selection: place }];
}

function pointerOf(tool: AssemblyTool): number | null {
  if (tool.kind === 'idle') return null;
  return tool.kind === 'pressed' || tool.kind === 'waiting' ? tool.press.pointer : tool.pointer;
}

function stay(tool: AssemblyTool): AssemblyStep {
  return { tool, out: [] };
}
