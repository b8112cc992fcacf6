import { type Design, type DesignProblem, parseDesign } from '@shared/design';

/** A design as a file: JSON that people can read and programs can compare. */
export function designFileText(design: Design): string {
  return `${JSON.stringify(design, null, 2)}\n`;
}

/** "Ladder knife 2" → "ladder-knife-2.layerwright.json". */
export function designFileName(design: Pick<Design, 'name'>): string {
  const plain = design.name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');
  return `${plain || 'design'}.layerwright.json`;
}

/** A file that was read, or what is wrong with it. */
export type ReadFile =
  | { readonly ok: true; readonly design: Design }
  | { readonly ok: false; readonly isNewer: boolean; readonly problems: readonly DesignProblem[] };

/** Larger than any design can be, bytes. */
export const LARGEST_FILE_BYTES = 5_000_000;

export function readDesignFile(text: string): ReadFile {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (error) {
    const why = error instanceof Error ? error.message : 'not JSON';
    return {
      ok: false,
      isNewer: false,
      problems: [{ path: [], code: 'not-json', message: `This is no design file: ${why}.` }],
    };
  }
  return parseDesign(json);
}

/** Where in the document: "bars › 2 › steps › 1 › pitchMm", counted from 1; empty for the whole document. */
export function pathWords(path: readonly (string | number)[]): string {
  return path.map((key) => (typeof key === 'number' ? String(key + 1) : key)).join(' › ');
}
