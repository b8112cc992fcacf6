import fc from 'fast-check';
import { repeatsOf } from './repeats';

const SEED = { seed: 20_266 };
const same = (a: string, b: string): boolean => a === b;
const say = (row: string): string =>
  repeatsOf([...row], same)
    .map(({ from, period, times }) => `${times}×${row.slice(from, from + period)}`)
    .join(' ');

describe('repeated groups', () => {
  it('are read as a smith says them', () => {
    expect(say('ababababababa')).toBe('6×ab 1×a');
    expect(say('abab')).toBe('2×ab');
    expect(say('aaaa')).toBe('4×a');
    expect(say('abc')).toBe('1×abc');
    expect(say('xabababy')).toBe('1×x 3×ab 1×y');
    expect(say('a')).toBe('1×a');
    expect(say('')).toBe('');
  });

  it('say the row again, whatever it is', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom('a', 'b', 'c'), { maxLength: 60 }), (row) => {
        const back = repeatsOf(row, same).flatMap(({ from, period, times }) =>
          Array.from({ length: times }, () => row.slice(from, from + period)).flat(),
        );
        expect(back).toEqual(row);
      }),
      SEED,
    );
  });
});
