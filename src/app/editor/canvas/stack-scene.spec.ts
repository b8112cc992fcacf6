import { formatFor } from '@shared/units';
import { type StackGeometry, stackGeometry } from './stack-geometry';
import { type LabelColumn, labelAt, labelColumn, stackFrame } from './stack-scene';
import { fitted } from './viewport';

const steels = new Map([
  ['1084', { name: '1084' }],
  ['15n20', { name: '15N20' }],
]);
const frame = stackFrame(1000, 600, 160);

function column(thicknesses: readonly number[], chosen: readonly number[] = []): LabelColumn {
  const layers = thicknesses.map((thicknessMm, i) => ({ steel: i % 2 ? '15n20' : '1084', thicknessMm }));
  const geometry: StackGeometry = stackGeometry({ widthMm: 40, layers });
  return labelColumn({
    stack: { layers },
    steels,
    format: formatFor('mm'),
    geometry,
    viewport: fitted({ acrossMm: 40, upMm: geometry.heightMm }, frame.area),
    frame,
    chosen: new Set(chosen),
    measure: (text) => text.length * 7,
  });
}

describe('names beside a stack', () => {
  it('are there for every layer where there is room, from the top down', () => {
    const { labels } = column([3, 2, 3]);
    expect(labels.map((label) => label.number)).toEqual(['3', '2', '1']);
    expect(labels[1]?.lines).toEqual([{ name: '15N20', figure: '2 mm' }]);
  });

  it('name a foil of 0.05 mm in a stack of 60 mm, to be picked by', () => {
    const thin = column([29.95, 0.05, 20, 10]);
    const foil = thin.labels.find((label) => label.place === 1);
    expect(foil?.lines[0]?.figure).toBe('0.05 mm');
    expect(labelAt(thin, { xPx: thin.leftPx + 10, yPx: foil?.middlePx ?? 0 })).toBe(1);
    expect(labelAt(thin, { xPx: thin.leftPx - 60, yPx: foil?.middlePx ?? 0 })).toBeNull();
  });

  it('name the group that repeats where layers are many', () => {
    const { labels } = column(Array.from({ length: 400 }, (_, i) => (i % 2 ? 0.1 : 0.2)));
    expect(labels.length).toBe(1);
    expect(labels[0]?.number).toBe('200 ×');
    // As they lie: the second on the first.
    expect(labels[0]?.lines.map((line) => line.name)).toEqual(['15N20', '1084']);
  });

  it('name what is chosen and the thickest where many layers follow no order', () => {
    const thicknesses = Array.from({ length: 400 }, (_, i) => 0.1 + ((i * i * 7) % 397) / 4000);
    const { labels } = column(thicknesses, [200]);
    expect(labels.every((label) => label.place !== null)).toBeTrue();
    expect(labels.some((label) => label.place === 200)).toBeTrue();
    const thickest = thicknesses.indexOf(Math.max(...thicknesses));
    expect(labels.some((label) => label.place === thickest)).toBeTrue();
  });
});
