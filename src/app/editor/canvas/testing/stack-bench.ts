import type { StackGesture } from '../contract';
import { NOTHING_SELECTED, type Selection } from '../selection';
import { stackGeometry } from '../stack-geometry';
import type { StackSheet } from '../stack-press';
import { IDLE, type StackTool, stackTool } from '../stack-tool';
import type { Modifiers, ToolInput, ToolOutput } from '../tool';
import type { Viewport } from '../viewport';

type Out = ToolOutput<StackGesture, Selection>;

export const NO_KEYS: Modifiers = { extends: false, toggles: false, isFree: false };
export const SHIFT: Modifiers = { ...NO_KEYS, extends: true };
export const CTRL: Modifiers = { ...NO_KEYS, toggles: true };
export const ALT: Modifiers = { ...NO_KEYS, isFree: true };
/** Five layers of 4 mm, 40 mm wide, at 10 px a millimetre: 40 px each, from y 500 up to 300, x 100 to 500. */
export const geometry = stackGeometry({
  widthMm: 40,
  layers: [4, 4, 4, 4, 4].map((thicknessMm) => ({ steel: 'x', thicknessMm })),
});
export const viewport: Viewport = { pxPerMm: 10, originPx: { xPx: 100, yPx: 500 } };
const sheet: StackSheet = {
  geometry,
  viewport,
  area: { leftPx: 60, topPx: 30, widthPx: 600, heightPx: 500 },
  selection: NOTHING_SELECTED,
  stockMm: [2, 3, 4, 5, 6],
  system: 'mm',
  labelAt: (at) => (at.xPx > 600 ? 2 : null),
};

/** A drawing and the page that holds it, as far as a tool can tell: it takes over what is chosen and seen. */
export class StackBench {
  tool: StackTool = IDLE;
  sheet: StackSheet;
  readonly out: Out[] = [];

  constructor(selection: Selection = NOTHING_SELECTED) {
    this.sheet = { ...sheet, selection };
  }

  send(input: ToolInput): readonly Out[] {
    const step = stackTool(this.tool, input, this.sheet);
    this.tool = step.tool;
    for (const asked of step.out) {
      this.out.push(asked);
      if (asked.kind === 'select') this.sheet = { ...this.sheet, selection: asked.selection };
      if (asked.kind === 'view') this.sheet = { ...this.sheet, viewport: asked.viewport };
    }
    return step.out;
  }

  press(xPx: number, yPx: number, modifiers = NO_KEYS, device: 'mouse' | 'touch' = 'mouse', pointer = 1) {
    return this.send({ kind: 'press', pointer, device, button: 'main', at: { xPx, yPx }, modifiers });
  }

  move(xPx: number, yPx: number, modifiers = NO_KEYS, pointer = 1) {
    return this.send({ kind: 'move', pointer, at: { xPx, yPx }, modifiers });
  }

  release(xPx: number, yPx: number, modifiers = NO_KEYS, pointer = 1) {
    return this.send({ kind: 'release', pointer, at: { xPx, yPx }, modifiers });
  }

  click(xPx: number, yPx: number, modifiers = NO_KEYS, device: 'mouse' | 'touch' = 'mouse') {
    this.press(xPx, yPx, modifiers, device);
    return this.release(xPx, yPx, modifiers);
  }

  get chosen(): readonly number[] {
    return [...this.sheet.selection.places].sort((a, b) => a - b);
  }

  get gestures(): readonly string[] {
    return this.out.flatMap((asked) => {
      if (asked.kind === 'edit') {
        const { gesture } = asked;
        if (gesture.kind === 'move') return [`move ${[...gesture.places].join(',')} to ${gesture.to}`];
        return gesture.kind === 'thickness' ? [`${gesture.place} is ${gesture.thicknessMm}`] : ['insert'];
      }
      if (asked.kind === 'end') return [asked.end];
      return asked.kind === 'start' ? ['start'] : [];
    });
  }
}
