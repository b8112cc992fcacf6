import * as fc from 'fast-check';
import {
  HISTORY_DEPTH,
  type History,
  aborted,
  canRedo,
  canUndo,
  edited,
  marked,
  redone,
  settled,
  startHistory,
  undone,
} from './index.js';

describe('history', () => {
  it('a gesture is one entry', () => {
    let history = marked(edited(startHistory(0), 1));
    for (const value of [2, 3, 4]) history = edited(history, value);
    history = settled(history);
    expect(undone(history).present).toBe(1);
    expect(redone(undone(history)).present).toBe(4);
  });

  it('an aborted gesture leaves value and redo as they were', () => {
    const before = undone(edited(edited(startHistory(0), 1), 2));
    const after = aborted(edited(marked(before), 9));
    expect(after).toEqual(before);
    expect(redone(after).present).toBe(2);
  });

  it('a gesture that changed nothing is no entry and keeps redo', () => {
    const before = undone(edited(startHistory(0), 1));
    expect(settled(edited(edited(marked(before), 5), 0))).toEqual(before);
  });

  it('keeps 500 steps', () => {
    let history: History<number> = startHistory(0);
    for (let i = 1; i <= HISTORY_DEPTH + 50; i++) history = edited(history, i);
    for (let i = 0; i < HISTORY_DEPTH; i++) history = undone(history);
    expect(history.present).toBe(50);
    expect(canUndo(history)).toBeFalse();
    expect(canRedo(history)).toBeTrue();
  });

  it('1 000 random runs of edit, undo, redo and gestures agree with a plain list of values', () => {
    type Move = { kind: 'edit'; value: number } | { kind: 'undo' | 'redo' | 'drag' | 'abort' };
    const move: fc.Arbitrary<Move> = fc.oneof(
      fc.integer().map((value) => ({ kind: 'edit' as const, value })),
      fc.constantFrom(
        { kind: 'undo' as const },
        { kind: 'redo' as const },
        { kind: 'drag' as const },
        { kind: 'abort' as const },
      ),
    );
    fc.assert(
      fc.property(fc.array(move, { maxLength: 80 }), (moves) => {
        let history: History<number> = startHistory(0);
        const values = [0];
        let at = 0;
        const push = (value: number): void => {
          if (value === values[at]) return;
          values.splice(at + 1, Infinity, value);
          at += 1;
        };
        for (const [i, next] of moves.entries()) {
          if (next.kind === 'edit') {
            history = edited(history, next.value);
            push(next.value);
          } else if (next.kind === 'undo') {
            history = undone(history);
            at = Math.max(0, at - 1);
          } else if (next.kind === 'redo') {
            history = redone(history);
            at = Math.min(values.length - 1, at + 1);
          } else if (next.kind === 'drag') {
            history = settled(edited(edited(marked(history), i), -i - 1));
            push(-i - 1);
          } else {
            history = aborted(edited(marked(history), i));
          }
          expect(history.present).toBe(values[at] as number);
        }
      }),
      { seed: 20_260, numRuns: 1_000 },
    );
  });
});
