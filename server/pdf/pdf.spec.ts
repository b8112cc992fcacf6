import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import jsQRModule from 'jsqr';
import { codeModules } from './code-modules.js';
import { woffToSfnt } from './woff-to-sfnt.js';

// The package gives its function as `default` of a CommonJS module.
const jsQR = jsQRModule.default;

describe('the code on a sheet', () => {
  it('25 mm wide at 150 dpi is read by another program', () => {
    const link = 'https://forge.example/designs/3f9b6f0e-55b1-4a7e-8a43-0d2f6a0c7d11';
    const modules = codeModules(link);
    // 25 mm at 150 dpi are 148 pixels; four modules of quiet zone on each side, as ISO/IEC 18004 asks.
    const inner = Math.round((25 / 25.4) * 150);
    const quiet = Math.ceil((4 * inner) / modules.length);
    const side = inner + 2 * quiet;
    const pixels = new Uint8ClampedArray(side * side * 4).fill(255);
    for (let y = 0; y < inner; y++) {
      for (let x = 0; x < inner; x++) {
        const row = modules[Math.floor((y / inner) * modules.length)];
        if (!row?.[Math.floor((x / inner) * modules.length)]) continue;
        pixels.fill(0, ((y + quiet) * side + x + quiet) * 4, ((y + quiet) * side + x + quiet) * 4 + 3);
      }
    }
    expect(jsQR(pixels, side, side)?.data).toBe(link);
  });
});

describe('woffToSfnt', () => {
  const woff = readFileSync(
    createRequire(import.meta.url).resolve('@ibm/plex-sans/fonts/complete/woff/IBMPlexSans-Regular.woff'),
  );

  it('gives the size that the file says its font has', () => {
    expect(woffToSfnt(woff).length).toBe(woff.readUInt32BE(16));
  });

  it('gives every table with the checksum the directory says', () => {
    const sfnt = woffToSfnt(woff);
    const count = sfnt.readUInt16BE(4);
    for (let i = 0; i < count; i++) {
      const entry = 12 + 16 * i;
      const tag = sfnt.toString('latin1', entry, entry + 4);
      // The checksum of `head` is taken with one of its own fields set to zero.
      if (tag === 'head') continue;
      const offset = sfnt.readUInt32BE(entry + 8);
      let sum = 0;
      for (let at = offset; at < offset + ((sfnt.readUInt32BE(entry + 12) + 3) & ~3); at += 4) {
        sum = (sum + sfnt.readUInt32BE(at)) >>> 0;
      }
      expect(sum)
        .withContext(tag)
        .toBe(sfnt.readUInt32BE(entry + 4));
    }
  });

  it('refuses what is no WOFF', () => {
    expect(() => woffToSfnt(Buffer.from('OTTO'))).toThrowError(RangeError);
  });
});
