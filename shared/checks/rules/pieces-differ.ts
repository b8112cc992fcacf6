import { type Finding, check } from '../check.js';

type Values = {
  /** Place of the piece that sticks out most, from 1. */
  piece: number;
  pieceBar: string;
  lengthMm: number;
  acrossMm: number;
  /** Pieces that stick out. */
  pieces: number;
  of: number;
  along: 'thickness' | 'width';
  trimmedFraction: number;
};

/** Nobody lays bars closer than this, mm. */
const NOTICED_MM = 0.5;
/** More than this of a piece trimmed away is a plan worth another look. */
const MUCH = 0.1;

/** Pieces of an assembly of unlike length, or unlike size across; the worst one is named. */
export const piecesDiffer = check<Values>({
  code: 'pieces-differ',
  source:
    'Follows from the sizes: pieces are trimmed to the shortest and the narrowest. Half a millimetre is let pass: common practice, no source',
  find: (forging) =>
    forging.bars.flatMap((bar, b): Finding<Values>[] => {
      const start = forging.design.bars[b]?.start;
      if (start?.kind !== 'assembly') return [];
      const across = start.along === 'thickness' ? 'widthMm' : 'thicknessMm';
      const parts = bar.overhangs.map((overhang, i) => {
        const piece = bar.pieces[i];
        const kept = piece
          ? (1 - overhang.lengthMm / piece.lengthMm) * (1 - overhang.acrossMm / piece[across])
          : 1;
        return { ...overhang, i, trimmedFraction: 1 - kept };
      });
      const out = parts.filter((part) => Math.max(part.lengthMm, part.acrossMm) > NOTICED_MM);
      const [worst] = [...out].sort((a, b2) => b2.trimmedFraction - a.trimmedFraction || a.i - b2.i);
      if (worst === undefined) return [];
      const from = start.pieces[worst.i]?.bar;
      const values: Values = {
        piece: worst.i + 1,
        pieceBar: forging.design.bars.find(({ id }) => id === from)?.name ?? '',
        lengthMm: worst.lengthMm,
        acrossMm: worst.acrossMm,
        pieces: out.length,
        of: parts.length,
        along: start.along,
        trimmedFraction: worst.trimmedFraction,
      };
      return [
        { severity: worst.trimmedFraction > MUCH ? 'caution' : 'note', bar: bar.id, stepId: null, values },
      ];
    }),
  words: (values, _severity, format) => {
    const across = values.along === 'thickness' ? 'width' : 'thickness';
    const off = [
      { mm: values.lengthMm, side: 'length' },
      { mm: values.acrossMm, side: across },
    ].filter(({ mm }) => mm > NOTICED_MM);
    const ways = off.map(({ mm, side }) => `${format.length(mm)} in ${side}`);
    const sides = off.map(({ side }) => side);
    const others =
      values.pieces > 1
        ? ` ${format.count(values.pieces)} of ${format.count(values.of)} pieces stick out; this one most.`
        : '';
    return {
      message: `Piece ${format.count(values.piece)} (“${values.pieceBar}”) sticks out by ${ways.join(' and ')}: ${format.percent(values.trimmedFraction)} of it is trimmed away.${others}`,
      remedy: `Draw, grind or trim the bars to one ${sides.join(' and ')} before they are put together.`,
    };
  },
});
