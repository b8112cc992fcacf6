import type { Assembly, Design } from '@shared/design';
import * as fc from 'fast-check';
import {
  editPiece,
  freeName,
  insertPiece,
  layerLike,
  movePiece,
  removePiece,
  setAllowance,
  setAlong,
  setLimit,
  setNote,
  setResult,
  setUnevenness,
} from './document-edits';
import { STRAIGHT, starter } from './testing/designs';

describe('edits of the document', () => {
  const composite = starter('five-bars');
  const pieces = (design: Design) => {
    const start = design.bars.find((bar) => bar.id === 'composite')?.start as Assembly;
    return start.pieces.map((piece) => piece.bar).join(' ');
  };

  it('moves a piece to before another', () => {
    expect(pieces(composite)).toBe('right left right left edge');
    expect(pieces(movePiece(composite, 'composite', 4, 0))).toBe('edge right left right left');
    expect(pieces(movePiece(composite, 'composite', 0, 5))).toBe('left right left edge right');
    expect(movePiece(composite, 'composite', 2, 2)).toBe(composite);
    expect(movePiece(composite, 'composite', 2, 3)).toBe(composite);
  });

  it('keeps every piece, wherever one goes', () => {
    fc.assert(
      fc.property(fc.nat(4), fc.nat(5), (place, to) => {
        const moved = pieces(movePiece(composite, 'composite', place, to)).split(' ');
        expect([...moved].sort()).toEqual(pieces(composite).split(' ').sort());
      }),
      { seed: 1 },
    );
  });

  it('leaves out of the document what is usual', () => {
    const turned = editPiece(composite, 'composite', 0, { quarterTurns: 2, endForEnd: true });
    expect((turned.bars[3]?.start as Assembly).pieces[0]).toEqual({
      bar: 'right',
      quarterTurns: 2,
      endForEnd: true,
    });
    const back = editPiece(turned, 'composite', 0, { quarterTurns: 0, endForEnd: false });
    expect((back.bars[3]?.start as Assembly).pieces[0]).toEqual({ bar: 'right' });
  });

  it('never leaves fewer than two pieces', () => {
    let design = insertPiece(composite, 'composite', 0, { bar: 'edge' });
    expect(pieces(design)).toBe('edge right left right left edge');
    for (let i = 0; i < 8; i++) design = removePiece(design, 'composite', 0);
    expect(pieces(design)).toBe('left edge');
  });

  it('changes nothing that is so already', () => {
    expect(setAlong(composite, 'composite', 'width')).toBe(composite);
    expect(setResult(composite, 'composite')).toBe(composite);
    expect(setNote(STRAIGHT, STRAIGHT.note ?? '')).toBe(STRAIGHT);
  });

  it('gives figures back to their defaults without a trace', () => {
    const own = setAllowance(STRAIGHT, 'kerfMm', 2);
    expect(own.allowances).toEqual({ kerfMm: 2 });
    const back = setAllowance(own, 'kerfMm', undefined);
    expect('allowances' in back).toBeFalse();
    expect(setLimit(setLimit(STRAIGHT, 'pressOpeningMm', 80), 'pressOpeningMm', undefined)).toEqual(STRAIGHT);
    expect(setUnevenness(setUnevenness(STRAIGHT, 0.3), 0)).toEqual(STRAIGHT);
    expect('note' in setNote(STRAIGHT, '')).toBeFalse();
  });

  it('finds a name that no bar has', () => {
    expect(freeName(composite, 'Bar')).toBe('Bar');
    expect(freeName(composite, 'Edge bar')).toBe('Edge bar 2');
  });

  it('lays a layer as thick as its like', () => {
    const layers = [
      { steel: 'a', thicknessMm: 3 },
      { steel: 'b', thicknessMm: 2 },
      { steel: 'a', thicknessMm: 4 },
    ];
    expect(layerLike(layers, 1, 'a')).toEqual({ steel: 'a', thicknessMm: 3 });
    expect(layerLike(layers, 0, 'b')).toEqual({ steel: 'b', thicknessMm: 2 });
    expect(layerLike(layers, 3, 'c')).toEqual({ steel: 'c', thicknessMm: 4 });
  });
});
