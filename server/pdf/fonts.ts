import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { woffToSfnt } from './woff-to-sfnt.js';

/** The faces that the sheets are set in. */
export interface SheetFonts {
  readonly sans: Buffer;
  readonly sansBold: Buffer;
  readonly mono: Buffer;
  readonly monoBold: Buffer;
}

let loaded: SheetFonts | undefined;

/** IBM Plex (SIL Open Font License 1.1) from the installed packages, with fractions and signs complete; read once. */
export function sheetFonts(): SheetFonts {
  loaded ??= {
    sans: face('@ibm/plex-sans/fonts/complete/woff/IBMPlexSans-Regular.woff'),
    sansBold: face('@ibm/plex-sans/fonts/complete/woff/IBMPlexSans-SemiBold.woff'),
    mono: face('@ibm/plex-mono/fonts/complete/woff/IBMPlexMono-Regular.woff'),
    monoBold: face('@ibm/plex-mono/fonts/complete/woff/IBMPlexMono-SemiBold.woff'),
  };
  return loaded;
}

function face(path: string): Buffer {
  return woffToSfnt(readFileSync(createRequire(import.meta.url).resolve(path)));
}
