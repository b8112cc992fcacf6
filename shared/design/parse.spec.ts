import { MAX_LAYERS, STARTERS, parseDesign } from './index.js';

const good = (): Record<string, unknown> =>
  JSON.parse(JSON.stringify(STARTERS[0]?.design)) as Record<string, unknown>;

/** The good design with one value put at a path. */
function withValue(path: readonly (string | number)[], value: unknown): unknown {
  const document = good();
  let at: unknown = document;
  for (const key of path.slice(0, -1)) at = (at as Record<string | number, unknown>)[key];
  (at as Record<string | number, unknown>)[path[path.length - 1] as string] = value;
  return document;
}

const problemsOf = (document: unknown) => {
  const parsed = parseDesign(document);
  return parsed.ok ? [] : parsed.problems.map((problem) => [problem.path.join('/'), problem.code]);
};

describe('parseDesign', () => {
  it('takes every starter, unchanged', () => {
    for (const { design } of STARTERS) {
      const parsed = parseDesign(JSON.parse(JSON.stringify(design)));
      expect(parsed).toEqual({ ok: true, design });
    }
  });

  it('refuses a newer document by its version and says so', () => {
    const parsed = parseDesign({ ...good(), version: 2, futureField: {} });
    expect(parsed.ok).toBeFalse();
    if (parsed.ok) return;
    expect(parsed.isNewer).toBeTrue();
    expect(parsed.problems[0]?.code).toBe('version-newer');
    expect(parsed.problems[0]?.message).toContain('document version 2');
  });

  it('refuses what is not a design', () => {
    for (const nothing of [null, undefined, 3, 'design', [], {}, { format: 'other' }]) {
      expect(problemsOf(nothing)[0]?.[1]).toBe('not-a-design');
    }
    expect(problemsOf({ ...good(), version: '1' })).toEqual([['version', 'version-unknown']]);
    expect(problemsOf({ ...good(), version: 0 })).toEqual([['version', 'version-unknown']]);
  });

  it('names the field of every mistake', () => {
    expect(problemsOf(withValue(['bars', 0, 'start', 'layers', 2, 'thicknessMm'], -1))).toEqual([
      ['bars/0/start/layers/2/thicknessMm', 'too-small'],
    ]);
    expect(problemsOf(withValue(['bars', 0, 'start', 'layers', 2, 'steel'], 'unobtainium'))).toEqual([
      ['bars/0/start/layers/2/steel', 'steel-unknown'],
    ]);
    expect(problemsOf(withValue(['result'], 'nowhere'))).toEqual([['result', 'bar-unknown']]);
    expect(problemsOf(withValue(['bars', 0, 'steps', 1, 'id'], 'billet-1'))).toEqual([
      ['bars/0/steps/1/id', 'id-twice'],
    ]);
    expect(problemsOf(withValue(['bars', 0, 'colour'], 'red'))).toEqual([['bars/0/colour', 'field-unknown']]);
    expect(problemsOf(withValue(['bars', 0, 'steps', 1, 'kind'], 'polish')).length).toBe(1);
    expect(problemsOf(withValue(['bars', 0, 'start', 'lengthMm'], Infinity)).length).toBe(1);
  });

  it('takes a bar only after those it is made of', () => {
    const document = JSON.parse(
      JSON.stringify(STARTERS.find((starter) => starter.id === 'san-mai')?.design),
    ) as {
      bars: unknown[];
    };
    document.bars.reverse();
    expect(problemsOf(document).map(([, code]) => code)).toContain('bar-not-before');
  });

  it('holds the limits of the document', () => {
    const layers = Array.from({ length: MAX_LAYERS + 1 }, () => ({ steel: '1084', thicknessMm: 1 }));
    expect(problemsOf(withValue(['bars', 0, 'start', 'layers'], layers))).toEqual([
      ['bars/0/start/layers', 'too-big'],
    ]);
    expect(problemsOf(withValue(['bars', 0, 'start', 'layers'], []))).toEqual([
      ['bars/0/start/layers', 'too-small'],
    ]);
    expect(problemsOf(withValue(['bars'], []))[0]?.[0]).toBe('bars');
  });

  it('is not led astray by prototype keys', () => {
    const poisoned = JSON.parse(
      `{"format":"layerwright.design","version":1,"__proto__":{"name":"x"}}`,
    ) as unknown;
    expect(parseDesign(poisoned).ok).toBeFalse();
    expect(({} as Record<string, unknown>)['name']).toBeUndefined();
  });
});
