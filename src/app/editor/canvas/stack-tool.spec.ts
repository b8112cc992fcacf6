import { only } from './selection';
import { gripAt, stackGeometry } from './stack-geometry';
import { IDLE } from './stack-tool';
import { ALT, CTRL, NO_KEYS, SHIFT, StackBench, geometry, viewport } from './testing/stack-bench';
import { toPx } from './viewport';

/** The middle of a layer on the sheet. */
const at = (place: number): readonly [number, number] => [300, 500 - 40 * place - 20];

describe('choosing with the pointer', () => {
  it('takes one layer, a range with Shift, one more or less with Ctrl, none beside the stack', () => {
    const bench = new StackBench();
    bench.click(...at(1));
    expect(bench.chosen).toEqual([1]);
    bench.click(...at(3), SHIFT);
    expect(bench.chosen).toEqual([1, 2, 3]);
    bench.click(...at(2), CTRL);
    expect(bench.chosen).toEqual([1, 3]);
    bench.click(...at(0), CTRL);
    expect(bench.chosen).toEqual([0, 1, 3]);
    bench.click(...at(3));
    expect(bench.chosen).toEqual([3]);
    bench.click(40, 40);
    expect(bench.chosen).toEqual([]);
    expect(bench.gestures).toEqual([]);
  });

  it('takes the layer by the name beside it', () => {
    const bench = new StackBench();
    bench.click(650, 400);
    expect(bench.chosen).toEqual([2]);
  });

  it('frames layers with Shift from beside the stack', () => {
    const bench = new StackBench(only(4));
    bench.press(80, 490, SHIFT);
    bench.move(200, 430, SHIFT);
    expect(bench.chosen).toEqual([0, 1]);
    bench.move(200, 490, SHIFT);
    expect(bench.chosen).toEqual([0]);
    bench.move(80, 370, SHIFT);
    expect(bench.chosen).toEqual([]);
    bench.release(200, 370, SHIFT);
    expect(bench.chosen).toEqual([0, 1, 2, 3]);
  });

  it('adds to the choice with Ctrl, and Escape gives it back', () => {
    const bench = new StackBench(only(4));
    bench.press(80, 490, CTRL);
    bench.move(200, 430, CTRL);
    expect(bench.chosen).toEqual([0, 1, 4]);
    bench.send({ kind: 'abort' });
    expect(bench.chosen).toEqual([4]);
    expect(bench.gestures).toEqual([]);
  });
});

describe('carrying layers', () => {
  it('starts once the pointer has moved, says where it stands at each new place, and settles', () => {
    const bench = new StackBench();
    bench.press(...at(1));
    bench.move(302, 441);
    expect(bench.gestures).toEqual([]);
    // The middle of layer 2 is at y 400.
    bench.move(300, 404);
    bench.move(300, 402);
    bench.move(300, 310);
    bench.release(300, 310);
    expect(bench.gestures).toEqual(['start', 'move 1 to 2', 'move 1 to 5', 'settle']);
    expect(bench.chosen).toEqual([4]);
    expect(bench.tool).toEqual(IDLE);
  });

  it('carries all that is chosen, and the choice follows', () => {
    const bench = new StackBench();
    bench.click(...at(0));
    bench.click(...at(2), CTRL);
    bench.press(...at(0));
    bench.move(300, 310);
    bench.release(300, 310);
    expect(bench.gestures).toEqual(['start', 'move 0,2 to 5', 'settle']);
    expect(bench.chosen).toEqual([3, 4]);
  });

  it('leaves nothing when it is aborted, and does nothing more until the button is up', () => {
    const bench = new StackBench(only(1));
    bench.press(...at(1));
    bench.move(300, 310);
    bench.send({ kind: 'abort' });
    bench.move(300, 480);
    bench.release(300, 480);
    expect(bench.gestures).toEqual(['start', 'move 1 to 5', 'abort']);
    expect(bench.chosen).toEqual([1]);
    expect(bench.tool).toEqual(IDLE);
  });

  it('is aborted when the browser takes the pointer away', () => {
    const bench = new StackBench();
    bench.press(...at(1));
    bench.move(300, 310);
    bench.send({ kind: 'lost', pointer: 1 });
    expect(bench.gestures).toEqual(['start', 'move 1 to 5', 'abort']);
    expect(bench.tool).toEqual(IDLE);
  });

  it('keeps to the stack as it was when it began, though the page has moved the layers meanwhile', () => {
    const bench = new StackBench();
    bench.press(...at(0));
    bench.move(300, 310);
    // The document now has other thicknesses in other places.
    const moved = stackGeometry({
      widthMm: 40,
      layers: [1, 1, 1, 1, 16].map((thicknessMm) => ({ steel: 'x', thicknessMm })),
    });
    bench.sheet = { ...bench.sheet, geometry: moved };
    bench.move(300, 430);
    expect(bench.gestures).toEqual(['start', 'move 0 to 5', 'move 0 to 2']);
  });
});

describe('drawing an edge', () => {
  it('changes the layer under it, snapping to stock', () => {
    const bench = new StackBench();
    // The seam between layers 1 and 2 is at y 420.
    bench.press(300, 421);
    bench.move(300, 411);
    bench.move(300, 409);
    bench.release(300, 397);
    // 10 px a millimetre: 4 mm and 10 px are 5 mm; 12 px stand on 5 mm as well; 24 px are 6.4, standing on 6.
    expect(bench.gestures).toEqual(['start', '1 is 5', '1 is 6', 'settle']);
    expect(bench.chosen).toEqual([1]);
  });

  it('is free with Alt, pressed on the way as well', () => {
    const bench = new StackBench();
    bench.press(300, 420);
    bench.move(300, 408);
    bench.move(300, 408, ALT);
    expect(bench.gestures).toEqual(['start', '1 is 5', '1 is 5.2']);
  });

  it('never makes a layer thinner than a document may hold', () => {
    const bench = new StackBench();
    bench.press(300, 420);
    bench.move(300, 600);
    expect(bench.gestures[1]).toBe('1 is 0.1');
    bench.move(300, 600, ALT);
    expect(bench.gestures.length).toBe(2);
  });

  it('gives back choice and thickness when aborted', () => {
    const bench = new StackBench();
    bench.press(300, 420);
    bench.move(300, 400);
    bench.send({ kind: 'abort' });
    expect(bench.gestures).toEqual(['start', '1 is 6', 'abort']);
  });

  it('works by the grip beside the chosen layer, by finger at once', () => {
    const bench = new StackBench(only(3));
    const grip = gripAt(geometry, viewport, 3);
    bench.press(grip.xPx, grip.yPx, NO_KEYS, 'touch');
    bench.move(grip.xPx, grip.yPx - 20);
    bench.release(grip.xPx, grip.yPx - 20);
    expect(bench.gestures).toEqual(['start', '3 is 6', 'settle']);
  });

  it('only chooses when it was a click', () => {
    const bench = new StackBench();
    bench.click(300, 421);
    expect(bench.chosen).toEqual([1]);
    bench.click(300, 418);
    expect(bench.chosen).toEqual([2]);
    expect(bench.gestures).toEqual([]);
  });
});

describe('fingers', () => {
  it('tap to choose', () => {
    const bench = new StackBench();
    bench.click(...at(2), NO_KEYS, 'touch');
    expect(bench.chosen).toEqual([2]);
    bench.click(30, 100, NO_KEYS, 'touch');
    expect(bench.chosen).toEqual([]);
  });

  it('scroll the page when they move at once', () => {
    const bench = new StackBench();
    bench.press(...at(2), NO_KEYS, 'touch');
    bench.move(300, 380);
    bench.move(300, 300);
    expect(bench.out).toEqual([]);
    bench.send({ kind: 'hold', pointer: 1 });
    expect(bench.out).toEqual([]);
    bench.send({ kind: 'lost', pointer: 1 });
    expect(bench.tool).toEqual(IDLE);
  });

  it('rest to take a layer up', () => {
    const bench = new StackBench();
    bench.press(...at(2), NO_KEYS, 'touch');
    bench.send({ kind: 'hold', pointer: 1 });
    expect(bench.chosen).toEqual([2]);
    bench.move(300, 485);
    bench.release(300, 485);
    expect(bench.gestures).toEqual(['start', 'move 2 to 0', 'settle']);
  });

  it('zoom with two, and change nothing', () => {
    const bench = new StackBench();
    bench.press(300, 400, NO_KEYS, 'touch', 1);
    bench.press(340, 400, NO_KEYS, 'touch', 2);
    bench.move(380, 400, NO_KEYS, 2);
    expect(bench.sheet.viewport.pxPerMm).toBeCloseTo(20, 9);
    bench.release(380, 400, NO_KEYS, 2);
    bench.release(300, 400, NO_KEYS, 1);
    expect(bench.tool).toEqual(IDLE);
    expect(bench.chosen).toEqual([]);
    expect(bench.gestures).toEqual([]);
  });
});

describe('pushing the sheet', () => {
  it('goes by the empty part of it, or by the middle button from anywhere', () => {
    const bench = new StackBench();
    bench.press(40, 40);
    bench.move(60, 70);
    bench.release(60, 70);
    expect(toPx(bench.sheet.viewport, { acrossMm: 0, upMm: 0 })).toEqual({ xPx: 120, yPx: 530 });
    const [xPx, yPx] = at(2);
    bench.send({
      kind: 'press',
      pointer: 1,
      device: 'mouse',
      button: 'middle',
      at: { xPx, yPx },
      modifiers: NO_KEYS,
    });
    bench.move(xPx - 20, yPx - 30);
    bench.release(xPx - 20, yPx - 30);
    expect(toPx(bench.sheet.viewport, { acrossMm: 0, upMm: 0 })).toEqual({ xPx: 100, yPx: 500 });
    expect(bench.chosen).toEqual([]);
  });
});
