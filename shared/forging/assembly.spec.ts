import { alternating, barFrom, designOf, stackOf } from './testing/designs.js';
import { evaluate, figuresOf, unaccountedKg } from './index.js';

describe('evaluate: assemblies', () => {
  const core = barFrom('core', stackOf([{ steel: '1095', thicknessMm: 4 }], 200, 42));
  const jacket = barFrom('jacket', stackOf(alternating(5), 420, 40));

  it('puts pieces on each other, trims what sticks out and loses a kerf for each cut', () => {
    const sanMai = barFrom('san-mai', {
      kind: 'assembly',
      along: 'thickness',
      pieces: [{ bar: 'jacket' }, { bar: 'core' }, { bar: 'jacket', quarterTurns: 2 }],
    });
    const forging = evaluate(designOf([core, jacket, sanMai]));
    const end = figuresOf(forging.result as NonNullable<typeof forging.result>);
    // Jacket: 2 pieces of (420 - 1.5)/2 = 209.25 mm, 13 mm thick; core 200 mm long, 42 mm wide.
    expect(end.lengthMm).toBe(200);
    expect(end.widthMm).toBe(40);
    expect(end.thicknessMm).toBeCloseTo(13 + 4 + 13, 12);
    expect(end.layers).toBe(11);
    expect(end.bands).toBe(11);
    expect(end.lossesKg.kerf).toBeCloseTo(1.5 * 40 * 13 * 7850e-9, 12);
    const trimMm3 = 2 * 9.25 * 40 * 13;
    const coreTrimMm3 = 2 * 200 * 4;
    expect(end.lossesKg.trim).toBeCloseTo((trimMm3 * 7850 + coreTrimMm3 * 7840) * 1e-9, 12);
    expect(unaccountedKg(forging.totals as NonNullable<typeof forging.totals>)).toBeCloseTo(0, 12);
    expect(forging.totals?.startMassKg).toBeCloseTo((200 * 42 * 4 * 7840 + 420 * 40 * 13 * 7850) * 1e-9, 12);
  });

  it('turns pieces by quarters and end for end as real bars turn', () => {
    const layers = [
      { steel: '1084', thicknessMm: 10 },
      { steel: '15n20', thicknessMm: 30 },
    ];
    const square = barFrom('square', stackOf(layers, 300, 40));
    const side = (quarterTurns: 0 | 1 | 2 | 3, endForEnd = false) => {
      const both = {
        kind: 'assembly',
        along: 'width',
        pieces: [
          { bar: 'square', quarterTurns, endForEnd },
          { bar: 'square', quarterTurns, endForEnd },
        ],
      } as const;
      const bar = evaluate(designOf([square, barFrom('pair', both)])).result?.bar;
      return { lie: bar?.lie, steels: [...(bar?.section?.steels ?? [])] };
    };
    // One quarter turn: the top (steel 1) goes to the right.
    expect(side(1)).toEqual({ lie: 'width', steels: [0, 1, 0, 1] });
    expect(side(3)).toEqual({ lie: 'width', steels: [1, 0, 1, 0] });
    expect(side(1, true)).toEqual({ lie: 'width', steels: [1, 0, 1, 0] });
    expect(side(0).lie).toBe('thickness');
  });

  it('pieces cut for bars that do not end in the result count as trim', () => {
    const used = barFrom('used', {
      kind: 'assembly',
      along: 'thickness',
      pieces: [{ bar: 'jacket' }, { bar: 'core' }],
    });
    const unused = barFrom('unused', {
      kind: 'assembly',
      along: 'thickness',
      pieces: [{ bar: 'jacket' }, { bar: 'jacket' }],
    });
    const forging = evaluate(designOf([core, jacket, unused, used], { result: 'used' }));
    expect(unaccountedKg(forging.totals as NonNullable<typeof forging.totals>)).toBeCloseTo(0, 12);
    expect(forging.bars.find((bar) => bar.id === 'jacket')?.cutInto).toBe(3);
    expect(forging.stock.length).toBe(3);
  });
});
