import { STARTERS } from '../starters/index.js';
import type { Design, Stack } from '../schema.js';
import {
  duplicateLayers,
  editStep,
  insertLayers,
  insertStep,
  mirrorLayers,
  moveLayers,
  moveStep,
  removeBar,
  removeLayers,
  repeatedGroup,
  setThickness,
  setThicknessRatio,
  splitLayer,
  swapSteel,
  toggleStep,
} from './index.js';

const steels = ['1084', '15n20', '1095', '5160'];
const layers = steels.map((steel, i) => ({ steel, thicknessMm: i + 1 }));
const start: Design = {
  format: 'layerwright.design',
  version: 1,
  name: 'Four',
  bars: [
    {
      id: 'b',
      name: 'Bar',
      start: { kind: 'stack', lengthMm: 100, widthMm: 30, layers },
      steps: [
        { id: 's1', kind: 'weld', heats: 2 },
        { id: 's2', kind: 'draw', lengthMm: 200 },
        { id: 's3', kind: 'corner' },
      ],
    },
  ],
  result: 'b',
};

const layersOf = (design: Design) => (design.bars[0]?.start as Stack).layers;
const order = (design: Design) => layersOf(design).map((layer) => layer.steel);
const steps = (design: Design) => design.bars[0]?.steps.map((step) => step.id);

describe('edits of layers', () => {
  it('moves layers to before the layer that is there now', () => {
    expect(order(moveLayers(start, 'b', new Set([0]), 3))).toEqual(['15n20', '1095', '1084', '5160']);
    expect(order(moveLayers(start, 'b', new Set([3]), 0))).toEqual(['5160', '1084', '15n20', '1095']);
    expect(order(moveLayers(start, 'b', new Set([0, 2]), 4))).toEqual(['15n20', '5160', '1084', '1095']);
  });

  it('gives back the very same design when nothing changes', () => {
    expect(moveLayers(start, 'b', new Set([1]), 1)).toBe(start);
    expect(moveLayers(start, 'b', new Set([1]), 2)).toBe(start);
    expect(setThickness(start, 'b', new Set([1]), 2)).toBe(start);
    expect(swapSteel(start, '52100', 'o1')).toBe(start);
    expect(insertLayers(start, 'b', 1, [])).toBe(start);
  });

  it('leaves the layers it does not touch the same objects', () => {
    const next = setThickness(start, 'b', new Set([1]), 9);
    expect(layersOf(next)[0]).toBe(layersOf(start)[0]);
    expect(layersOf(next)[1]?.thicknessMm).toBe(9);
  });

  it('inserts, copies, splits, mirrors and removes', () => {
    expect(order(insertLayers(start, 'b', 1, [{ steel: 'o1', thicknessMm: 1 }]))).toEqual([
      '1084',
      'o1',
      '15n20',
      '1095',
      '5160',
    ]);
    expect(order(duplicateLayers(start, 'b', new Set([0, 1])))).toEqual([
      '1084',
      '15n20',
      '1084',
      '15n20',
      '1095',
      '5160',
    ]);
    expect(layersOf(splitLayer(start, 'b', 3, 4)).map((layer) => layer.thicknessMm)).toEqual([
      1, 2, 3, 1, 1, 1, 1,
    ]);
    expect(order(mirrorLayers(start, 'b'))).toEqual([...steels].reverse());
    expect(order(mirrorLayers(start, 'b', 1, 3))).toEqual(['1084', '1095', '15n20', '5160']);
    expect(order(removeLayers(start, 'b', new Set([0, 3])))).toEqual(['15n20', '1095']);
    expect(order(removeLayers(start, 'b', new Set([0, 1, 2, 3]))).length).toBe(1);
  });

  it('repeats "1084 then 15N20, 7 times, end on 1084" to 15 layers', () => {
    const group = repeatedGroup(layers.slice(0, 2), 7, true);
    expect(group.length).toBe(15);
    expect(group[14]?.steel).toBe('1084');
    expect(group.filter((layer) => layer.steel === '15n20').length).toBe(7);
  });

  it('sets the ratio of two steels and keeps the height', () => {
    const next = layersOf(setThicknessRatio(start, 'b', '1084', '15n20', 2));
    expect(next[0]?.thicknessMm).toBeCloseTo(2, 12);
    expect(next[1]?.thicknessMm).toBeCloseTo(1, 12);
    expect(next.reduce((sum, layer) => sum + layer.thicknessMm, 0)).toBeCloseTo(10, 12);
  });

  it('swaps a steel wherever it is laid', () => {
    expect(order(swapSteel(start, '1084', '1075'))).toEqual(['1075', '15n20', '1095', '5160']);
  });
});

describe('edits of steps', () => {
  it('inserts, moves and switches off', () => {
    expect(steps(insertStep(start, 'b', 1, { id: 'new', kind: 'corner' }))).toEqual([
      's1',
      'new',
      's2',
      's3',
    ]);
    expect(steps(moveStep(start, 'b', 's1', 2))).toEqual(['s2', 's3', 's1']);
    expect(moveStep(start, 'b', 's1', 0)).toBe(start);
    const off = toggleStep(start, 'b', 's1');
    expect(off.bars[0]?.steps[0]?.isOff).toBeTrue();
    expect(toggleStep(off, 'b', 's1')).toEqual(start);
  });

  it('changes fields, takes optional ones away and keeps the other steps', () => {
    const next = editStep(start, 'b', 's2', { lengthMm: undefined, thicknessMm: 12 });
    expect(next.bars[0]?.steps[1]).toEqual({ id: 's2', kind: 'draw', thicknessMm: 12 });
    expect(next.bars[0]?.steps[0]).toBe(start.bars[0]?.steps[0] as never);
    expect(editStep(start, 'b', 's1', { heats: 2 })).toBe(start);
  });
});

describe('edits of bars', () => {
  it('keeps a bar that another is made of', () => {
    const sanMai = STARTERS.find((starter) => starter.id === 'san-mai')?.design as Design;
    expect(removeBar(sanMai, 'core')).toBe(sanMai);
    expect(removeBar(sanMai, sanMai.result)).toBe(sanMai);
  });
});
