import { DESIGN_FORMAT, DESIGN_VERSION, type Design, moveLayers } from '@shared/design';
import fc from 'fast-check';
import { NOTHING_SELECTED, type Selection, only } from './selection';
import { type KeyPress, stackKey } from './stack-keys';

const plain = (key: string): KeyPress => ({ key, shift: false, alt: false, command: false });
const shifted = (key: string): KeyPress => ({ ...plain(key), shift: true });
const alted = (key: string): KeyPress => ({ ...plain(key), alt: true });

function chosen(press: KeyPress, selection: Selection, count = 5): readonly number[] | null {
  const asked = stackKey(press, count, selection);
  return asked && 'selection' in asked ? [...asked.selection.places].sort((a, b) => a - b) : null;
}

describe('keys on a stack', () => {
  it('go up and down the layers and stop at the ends', () => {
    expect(chosen(plain('ArrowUp'), NOTHING_SELECTED)).toEqual([0]);
    expect(chosen(plain('ArrowDown'), NOTHING_SELECTED)).toEqual([4]);
    expect(chosen(plain('ArrowUp'), only(2))).toEqual([3]);
    expect(chosen(plain('ArrowUp'), only(4))).toEqual([4]);
    expect(chosen(plain('ArrowDown'), only(0))).toEqual([0]);
    expect(chosen(plain('Home'), only(2))).toEqual([0]);
    expect(chosen(plain('End'), only(2))).toEqual([4]);
  });

  it('widen the choice with Shift and narrow it again', () => {
    const one = stackKey(shifted('ArrowUp'), 5, only(2));
    const two = one && 'selection' in one ? stackKey(shifted('ArrowUp'), 5, one.selection) : null;
    const back = two && 'selection' in two ? stackKey(shifted('ArrowDown'), 5, two.selection) : null;
    const places = [one, two, back].map(
      (asked) => asked && 'selection' in asked && [...asked.selection.places],
    );
    expect(places).toEqual([
      [2, 3],
      [2, 3, 4],
      [2, 3],
    ]);
    expect(chosen({ ...plain('a'), command: true }, only(2))).toEqual([0, 1, 2, 3, 4]);
    expect(chosen(plain('Escape'), only(2))).toEqual([]);
    expect(stackKey(plain('Escape'), 5, NOTHING_SELECTED)).toBeNull();
  });

  it('move layers with Alt, as a whole gesture', () => {
    const up = stackKey(alted('ArrowUp'), 5, only(2));
    expect(up?.kind === 'gesture' && up.gesture).toEqual({ kind: 'move', places: new Set([2]), to: 4 });
    expect(chosen(alted('ArrowUp'), only(2))).toEqual([3]);
    const down = stackKey(alted('ArrowDown'), 5, only(2));
    expect(down?.kind === 'gesture' && down.gesture).toEqual({ kind: 'move', places: new Set([2]), to: 1 });
    expect(stackKey(alted('ArrowUp'), 5, only(4))).toBeNull();
    expect(stackKey(alted('ArrowDown'), 5, only(0))).toBeNull();
    expect(stackKey(alted('ArrowDown'), 5, NOTHING_SELECTED)).toBeNull();
  });

  it('bring layers together that lie apart', () => {
    const apart: Selection = { places: new Set([0, 3]), anchor: 0, cursor: 3 };
    expect(chosen(alted('ArrowUp'), apart)).toEqual([2, 3]);
    expect(chosen(alted('ArrowDown'), apart)).toEqual([0, 1]);
  });

  it('zoom and fit, and leave every other key to the page', () => {
    expect(stackKey(plain('+'), 5, only(1))?.kind).toBe('zoom');
    expect(stackKey(plain('-'), 5, only(1))?.kind).toBe('zoom');
    expect(stackKey(plain('0'), 5, only(1))?.kind).toBe('fit');
    for (const key of ['Tab', 'Delete', 'x', 'Enter', 'ArrowLeft']) {
      expect(stackKey(plain(key), 5, only(1))).toBeNull();
    }
    expect(stackKey({ ...plain('z'), command: true }, 5, only(1))).toBeNull();
  });

  it('up and down again is where it was, for layers that lie together', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 2, max: 12 }).chain((count) =>
          fc.record({
            count: fc.constant(count),
            first: fc.integer({ min: 0, max: count - 2 }),
            size: fc.integer({ min: 1, max: count - 1 }),
          }),
        ),
        ({ count, first, size }) => {
          const last = Math.min(count - 2, first + size - 1);
          const places = new Set(Array.from({ length: last - first + 1 }, (_, i) => first + i));
          const design = stackOf(count);
          const up = stackKey(alted('ArrowUp'), count, { places, anchor: first, cursor: last });
          if (up?.kind !== 'gesture' || up.gesture.kind !== 'move') throw new Error('no move');
          const raised = moveLayers(design, 'bar', up.gesture.places, up.gesture.to);
          expect(raised).not.toBe(design);
          const down = stackKey(alted('ArrowDown'), count, up.selection);
          if (down?.kind !== 'gesture' || down.gesture.kind !== 'move') throw new Error('no move');
          expect(moveLayers(raised, 'bar', down.gesture.places, down.gesture.to)).toEqual(design);
          expect(down.selection.places).toEqual(places);
          expect(down.selection.cursor).toBe(last);
        },
      ),
      { seed: 20_272 },
    );
  });
});

function stackOf(count: number): Design {
  const layers = Array.from({ length: count }, (_, i) => ({ steel: '1084', thicknessMm: i + 1 }));
  return {
    format: DESIGN_FORMAT,
    version: DESIGN_VERSION,
    name: 'Test',
    bars: [
      { id: 'bar', name: 'Bar', start: { kind: 'stack', lengthMm: 100, widthMm: 40, layers }, steps: [] },
    ],
    result: 'bar',
  };
}
