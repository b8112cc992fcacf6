import fc from 'fast-check';
import { only } from './selection';
import { IDLE, isEditing } from './stack-tool';
import { StackBench } from './testing/stack-bench';
import type { ToolInput } from './tool';

const pointOnSheet = fc.record({
  xPx: fc.integer({ min: 0, max: 700 }),
  yPx: fc.integer({ min: 250, max: 560 }),
});
const keys = fc.record({ extends: fc.boolean(), toggles: fc.boolean(), isFree: fc.boolean() });
const pointers = fc.integer({ min: 1, max: 2 });
const inputs: fc.Arbitrary<ToolInput> = fc.oneof(
  fc.record({
    kind: fc.constant('press' as const),
    pointer: pointers,
    device: fc.constantFrom('mouse' as const, 'touch' as const, 'pen' as const),
    button: fc.constantFrom('main' as const, 'main' as const, 'middle' as const, 'other' as const),
    at: pointOnSheet,
    modifiers: keys,
  }),
  fc.record({ kind: fc.constant('move' as const), pointer: pointers, at: pointOnSheet, modifiers: keys }),
  fc.record({ kind: fc.constant('move' as const), pointer: pointers, at: pointOnSheet, modifiers: keys }),
  fc.record({ kind: fc.constant('release' as const), pointer: pointers, at: pointOnSheet, modifiers: keys }),
  fc.record({ kind: fc.constant('hold' as const), pointer: pointers }),
  fc.record({ kind: fc.constant('lost' as const), pointer: pointers }),
  fc.constant({ kind: 'abort' as const }),
);

describe('any run of inputs on a stack', () => {
  it('gives gestures that start, edit and end in this order, and one at a time', () => {
    fc.assert(
      fc.property(fc.array(inputs, { maxLength: 60 }), (run) => {
        const bench = new StackBench();
        for (const input of run) bench.send(input);
        let isOpen = false;
        for (const asked of bench.out) {
          if (asked.kind === 'start') {
            expect(isOpen).toBeFalse();
            isOpen = true;
          } else if (asked.kind === 'edit') expect(isOpen).toBeTrue();
          else if (asked.kind === 'end') {
            expect(isOpen).toBeTrue();
            isOpen = false;
          }
        }
        expect(isOpen).toBe(isEditing(bench.tool));
      }),
      { seed: 20_268, numRuns: 500 },
    );
  });

  it('leaves nothing behind when it is aborted: the choice is as it was, no gesture is open', () => {
    fc.assert(
      fc.property(fc.array(inputs, { maxLength: 40 }), (run) => {
        const bench = new StackBench(only(1));
        let atStart = bench.sheet.selection;
        for (const input of run) {
          let selection = bench.sheet.selection;
          for (const asked of bench.send(input)) {
            if (asked.kind === 'select') selection = asked.selection;
            if (asked.kind === 'start') atStart = selection;
          }
        }
        const wasEditing = isEditing(bench.tool);
        const out = bench.send({ kind: 'abort' });
        expect(isEditing(bench.tool)).toBeFalse();
        expect(out.filter((asked) => asked.kind === 'end').length).toBe(wasEditing ? 1 : 0);
        if (wasEditing) expect(bench.sheet.selection).toEqual(atStart);
        expect(bench.send({ kind: 'abort' }).filter((asked) => asked.kind === 'end')).toEqual([]);
      }),
      { seed: 20_269, numRuns: 500 },
    );
  });

  it('only ever speaks of layers that there are', () => {
    fc.assert(
      fc.property(fc.array(inputs, { maxLength: 60 }), (run) => {
        const bench = new StackBench();
        for (const input of run) bench.send(input);
        for (const asked of bench.out) {
          if (asked.kind === 'select') {
            for (const place of asked.selection.places) expect(place).toBeLessThan(5);
          }
          if (asked.kind === 'edit' && asked.gesture.kind === 'move') {
            expect(asked.gesture.to).toBeGreaterThanOrEqual(0);
            expect(asked.gesture.to).toBeLessThanOrEqual(5);
          }
        }
      }),
      { seed: 20_270, numRuns: 500 },
    );
  });

  it('ends idle once every pointer is up', () => {
    fc.assert(
      fc.property(fc.array(inputs, { maxLength: 60 }), (run) => {
        const bench = new StackBench();
        for (const input of run) bench.send(input);
        for (const pointer of [1, 2]) bench.send({ kind: 'lost', pointer });
        expect(bench.tool).toEqual(IDLE);
      }),
      { seed: 20_271, numRuns: 500 },
    );
  });
});
