import type { Piece } from '@shared/design';
import fc from 'fast-check';
import {
  type AssemblyGeometry,
  handleAt,
  hitAssembly,
  pieceLanding,
  quartersBetween,
} from './assembly-geometry';
import { assemblyKey } from './assembly-keys';
import {
  type AssemblySheet,
  type AssemblyTool,
  IDLE_ASSEMBLY,
  assemblyTool,
  isAssembling,
  placeAfterMove,
} from './assembly-tool';
import type { AssemblyGesture } from './contract';
import type { ToolInput, ToolOutput } from './tool';
import type { Viewport } from './viewport';

const NO_KEYS = { extends: false, toggles: false, isFree: false };
/** Three pieces of 10 × 10 mm side by side at 10 px a millimetre: x 100 to 400, y 200 to 300. */
const geometry: AssemblyGeometry = {
  along: 'width',
  boxes: [0, 10, 20].map((acrossMm) => ({ acrossMm, upMm: 0, widthMm: 10, heightMm: 10 })),
};
const viewport: Viewport = { pxPerMm: 10, originPx: { xPx: 100, yPx: 300 } };
const pieces: readonly Piece[] = [{ bar: 'a' }, { bar: 'b', quarterTurns: 3 }, { bar: 'c', endForEnd: true }];

class Bench {
  tool: AssemblyTool = IDLE_ASSEMBLY;
  sheet: AssemblySheet;
  readonly out: ToolOutput<AssemblyGesture, number | null>[] = [];

  constructor(chosen: number | null = null) {
    this.sheet = { geometry, viewport, pieces, chosen, labelAt: (at) => (at.xPx > 600 ? 2 : null) };
  }

  send(input: ToolInput): void {
    const step = assemblyTool(this.tool, input, this.sheet);
    this.tool = step.tool;
    for (const asked of step.out) {
      this.out.push(asked);
      if (asked.kind === 'select') this.sheet = { ...this.sheet, chosen: asked.selection };
    }
  }

  press(xPx: number, yPx: number, device: 'mouse' | 'touch' = 'mouse'): void {
    this.send({ kind: 'press', pointer: 1, device, button: 'main', at: { xPx, yPx }, modifiers: NO_KEYS });
  }

  move(xPx: number, yPx: number): void {
    this.send({ kind: 'move', pointer: 1, at: { xPx, yPx }, modifiers: NO_KEYS });
  }

  release(xPx: number, yPx: number): void {
    this.send({ kind: 'release', pointer: 1, at: { xPx, yPx }, modifiers: NO_KEYS });
  }

  get gestures(): readonly string[] {
    return this.out.flatMap((asked) => {
      if (asked.kind === 'start') return ['start'];
      if (asked.kind === 'end') return [asked.end];
      if (asked.kind !== 'edit') return [];
      const { gesture } = asked;
      if (gesture.kind === 'move') return [`${gesture.place} to ${gesture.to}`];
      return gesture.kind === 'turn' ? [`${gesture.place} by ${gesture.quarterTurns}`] : [gesture.kind];
    });
  }
}

describe('pieces of an assembly', () => {
  it('are picked where they lie, a thin one some pixels off as well', () => {
    expect(hitAssembly(geometry, viewport, { xPx: 250, yPx: 250 }, 'fine', null)).toEqual({
      kind: 'piece',
      place: 1,
    });
    expect(hitAssembly(geometry, viewport, { xPx: 250, yPx: 350 }, 'fine', null)).toEqual({ kind: 'empty' });
    const thin: AssemblyGeometry = {
      along: 'thickness',
      boxes: [
        { acrossMm: 0, upMm: 0, widthMm: 30, heightMm: 10 },
        { acrossMm: 0, upMm: 10, widthMm: 30, heightMm: 0.1 },
        { acrossMm: 0, upMm: 10.1, widthMm: 30, heightMm: 10 },
      ],
    };
    const middle = { xPx: 250, yPx: 300 - 104 };
    expect(hitAssembly(thin, viewport, middle, 'fine', null)).toEqual({ kind: 'piece', place: 1 });
  });

  it('land where the middle of each piece says', () => {
    const landings = [-5, 4, 6, 14, 16, 24, 26, 90].map((acrossMm) =>
      pieceLanding(geometry, { acrossMm, upMm: 5 }),
    );
    expect(landings).toEqual([0, 0, 1, 1, 2, 2, 3, 3]);
  });

  it('are carried to another place, and the choice follows', () => {
    const bench = new Bench();
    bench.press(150, 250);
    bench.move(260, 250);
    bench.move(390, 250);
    bench.release(390, 250);
    expect(bench.gestures).toEqual(['start', '0 to 2', '0 to 3', 'settle']);
    expect(bench.sheet.chosen).toBe(2);
  });

  it('are turned by the handle: clockwise takes the top to the right', () => {
    const bench = new Bench(0);
    const handle = handleAt(geometry, viewport, 0);
    bench.press(handle.xPx, handle.yPx);
    // From up right of the middle (150, 250) to down right of it.
    bench.move(216, 316);
    bench.move(84, 316);
    bench.release(84, 184);
    expect(bench.gestures).toEqual(['start', '0 by 1', '0 by 2', '0 by 3', 'settle']);
  });

  it('are turned once by a click on the handle', () => {
    const bench = new Bench(1);
    const handle = handleAt(geometry, viewport, 1);
    bench.press(handle.xPx, handle.yPx);
    bench.release(handle.xPx, handle.yPx);
    expect(bench.gestures).toEqual(['start', '1 by 0', 'settle']);
  });

  it('lie as before when the gesture is aborted', () => {
    const bench = new Bench();
    bench.press(150, 250);
    bench.move(390, 250);
    bench.send({ kind: 'abort' });
    bench.release(390, 250);
    expect(bench.gestures).toEqual(['start', '0 to 3', 'abort']);
    expect(bench.sheet.chosen).toBe(0);
  });

  it('wait for a finger to rest', () => {
    const bench = new Bench();
    bench.press(150, 250, 'touch');
    bench.send({ kind: 'hold', pointer: 1 });
    bench.move(390, 250);
    bench.release(390, 250);
    expect(bench.gestures).toEqual(['start', '0 to 3', 'settle']);
    const scrolling = new Bench();
    scrolling.press(150, 250, 'touch');
    scrolling.move(150, 220);
    scrolling.send({ kind: 'hold', pointer: 1 });
    expect(scrolling.gestures).toEqual([]);
  });

  it('are chosen by a click on them or on their name, and let go beside them', () => {
    const bench = new Bench();
    bench.press(250, 250);
    bench.release(250, 250);
    expect(bench.sheet.chosen).toBe(1);
    bench.press(650, 100);
    bench.release(650, 100);
    expect(bench.sheet.chosen).toBe(2);
    bench.press(50, 50);
    bench.release(50, 50);
    expect(bench.sheet.chosen).toBeNull();
  });
});

describe('quarter turns', () => {
  it('are counted clockwise on the sheet', () => {
    const middle = { xPx: 0, yPx: 0 };
    const up = { xPx: 0, yPx: -10 };
    expect(quartersBetween(middle, up, { xPx: 10, yPx: 0 })).toBe(1);
    expect(quartersBetween(middle, up, { xPx: 0, yPx: 10 })).toBe(2);
    expect(quartersBetween(middle, up, { xPx: -10, yPx: 0 })).toBe(3);
    expect(quartersBetween(middle, up, { xPx: 3, yPx: -10 })).toBe(0);
  });
});

describe('keys on an assembly', () => {
  const plain = { shift: false, alt: false, command: false };

  it('choose, move, turn', () => {
    expect(assemblyKey({ ...plain, key: 'ArrowRight' }, pieces, null)).toEqual({
      kind: 'select',
      selection: 0,
    });
    expect(assemblyKey({ ...plain, key: 'ArrowUp' }, pieces, 2)).toEqual({ kind: 'select', selection: 2 });
    expect(assemblyKey({ ...plain, key: 'ArrowLeft', alt: true }, pieces, 2)).toEqual({
      kind: 'gesture',
      gesture: { kind: 'move', place: 2, to: 1 },
      selection: 1,
    });
    expect(assemblyKey({ ...plain, key: 'ArrowRight', alt: true }, pieces, 2)).toBeNull();
    const turn = assemblyKey({ ...plain, key: 'r' }, pieces, 1);
    expect(turn?.kind === 'gesture' && turn.gesture).toEqual({ kind: 'turn', place: 1, quarterTurns: 0 });
    const back = assemblyKey({ ...plain, key: 'R', shift: true }, pieces, 0);
    expect(back?.kind === 'gesture' && back.gesture).toEqual({ kind: 'turn', place: 0, quarterTurns: 3 });
    const end = assemblyKey({ ...plain, key: 'e' }, pieces, 2);
    expect(end?.kind === 'gesture' && end.gesture).toEqual({
      kind: 'end-for-end',
      place: 2,
      endForEnd: false,
    });
    expect(assemblyKey({ ...plain, key: 'r' }, pieces, null)).toBeNull();
    expect(assemblyKey({ ...plain, key: 'z', command: true }, pieces, 1)).toBeNull();
  });
});

describe('any run of inputs on an assembly', () => {
  const at = fc.record({ xPx: fc.integer({ min: 50, max: 700 }), yPx: fc.integer({ min: 150, max: 350 }) });
  const modifiers = fc.constant(NO_KEYS);
  const inputs: fc.Arbitrary<ToolInput> = fc.oneof(
    fc.record({
      kind: fc.constant('press' as const),
      pointer: fc.integer({ min: 1, max: 2 }),
      device: fc.constantFrom('mouse' as const, 'touch' as const),
      button: fc.constant('main' as const),
      at,
      modifiers,
    }),
    fc.record({ kind: fc.constant('move' as const), pointer: fc.integer({ min: 1, max: 2 }), at, modifiers }),
    fc.record({
      kind: fc.constant('release' as const),
      pointer: fc.integer({ min: 1, max: 2 }),
      at,
      modifiers,
    }),
    fc.record({ kind: fc.constant('hold' as const), pointer: fc.integer({ min: 1, max: 2 }) }),
    fc.record({ kind: fc.constant('lost' as const), pointer: fc.integer({ min: 1, max: 2 }) }),
    fc.constant({ kind: 'abort' as const }),
  );

  it('gives whole gestures, one at a time, and speaks only of pieces that there are', () => {
    fc.assert(
      fc.property(fc.array(inputs, { maxLength: 60 }), (run) => {
        const bench = new Bench();
        for (const input of run) bench.send(input);
        let isOpen = false;
        for (const asked of bench.out) {
          if (asked.kind === 'start') {
            expect(isOpen).toBeFalse();
            isOpen = true;
          } else if (asked.kind === 'end') {
            expect(isOpen).toBeTrue();
            isOpen = false;
          } else if (asked.kind === 'edit') {
            expect(isOpen).toBeTrue();
            if (asked.gesture.kind === 'move') {
              expect(placeAfterMove(asked.gesture.place, asked.gesture.to)).toBeLessThan(3);
            }
          } else if (asked.kind === 'select' && asked.selection !== null) {
            expect(asked.selection).toBeLessThan(3);
          }
        }
        expect(isOpen).toBe(isAssembling(bench.tool));
        for (const pointer of [1, 2]) bench.send({ kind: 'lost', pointer });
        expect(bench.tool).toEqual(IDLE_ASSEMBLY);
      }),
      { seed: 20_275, numRuns: 500 },
    );
  });
});
