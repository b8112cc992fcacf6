import { STRAIGHT } from '../testing/designs';
import { designFileName, designFileText, pathWords, readDesignFile } from './design-file';

describe('design file', () => {
  it('comes back as it went out', () => {
    const read = readDesignFile(designFileText(STRAIGHT));
    expect(read.ok && read.design).toEqual(STRAIGHT);
  });

  it('says what is no design at all', () => {
    expect(readDesignFile('hello').ok).toBeFalse();
    expect(readDesignFile('[]').ok).toBeFalse();
  });

  it('names the fields that are wrong', () => {
    const json = JSON.parse(designFileText(STRAIGHT)) as { bars: { steps: { heats: unknown }[] }[] };
    const [step] = json.bars[0]?.steps ?? [];
    if (step) step.heats = -1;
    const read = readDesignFile(JSON.stringify(json));
    expect(read.ok ? [] : read.problems.map(({ path }) => pathWords(path))).toEqual([
      'bars › 1 › steps › 1 › heats',
    ]);
  });

  it('refuses a newer version and says so', () => {
    const read = readDesignFile(JSON.stringify({ ...STRAIGHT, version: 99 }));
    expect(read.ok).toBeFalse();
    expect(!read.ok && read.isNewer).toBeTrue();
  });

  it('makes a file name that every system takes', () => {
    expect(designFileName({ name: 'Ladder knife, 2″ “Größe”' })).toBe(
      'ladder-knife-2-gro-e.layerwright.json',
    );
    expect(designFileName({ name: '☃' })).toBe('design.layerwright.json');
  });
});
