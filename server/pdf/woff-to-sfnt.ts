import { inflateSync } from 'node:zlib';

const HEADER_BYTES = 44;
const ENTRY_BYTES = 20;

/**
 * The font inside a WOFF 1.0 file, as plain sfnt.
 *
 * pdfkit's font reader fails on some WOFF files and on WOFF 2; unpacked, each of them works.
 * Source: W3C, "WOFF File Format 1.0", sections 4 (header), 5 (table directory).
 * @throws RangeError when the bytes are not a WOFF 1.0 file
 */
export function woffToSfnt(woff: Buffer): Buffer {
  if (woff.length < HEADER_BYTES || woff.toString('latin1', 0, 4) !== 'wOFF') {
    throw new RangeError(`woffToSfnt: ${woff.length} bytes that don't begin with "wOFF"`);
  }
  const tableCount = woff.readUInt16BE(12);
  const tables = Array.from({ length: tableCount }, (_, i) => tableAt(woff, HEADER_BYTES + i * ENTRY_BYTES));
  const directory = Buffer.alloc(12 + 16 * tableCount);
  const power = Math.floor(Math.log2(tableCount));
  directory.writeUInt32BE(woff.readUInt32BE(4), 0);
  directory.writeUInt16BE(tableCount, 4);
  directory.writeUInt16BE(2 ** power * 16, 6);
  directory.writeUInt16BE(power, 8);
  directory.writeUInt16BE(tableCount * 16 - 2 ** power * 16, 10);
  let offset = directory.length;
  const bodies: Buffer[] = [];
  for (const [i, table] of tables.entries()) {
    const entry = 12 + 16 * i;
    table.tag.copy(directory, entry);
    directory.writeUInt32BE(table.checksum, entry + 4);
    directory.writeUInt32BE(offset, entry + 8);
    directory.writeUInt32BE(table.data.length, entry + 12);
    const padded = Buffer.alloc((table.data.length + 3) & ~3);
    table.data.copy(padded);
    bodies.push(padded);
    offset += padded.length;
  }
  return Buffer.concat([directory, ...bodies]);
}

function tableAt(woff: Buffer, entry: number): { tag: Buffer; checksum: number; data: Buffer } {
  const offset = woff.readUInt32BE(entry + 4);
  const packedLength = woff.readUInt32BE(entry + 8);
  const length = woff.readUInt32BE(entry + 12);
  const packed = woff.subarray(offset, offset + packedLength);
  return {
    tag: woff.subarray(entry, entry + 4),
    checksum: woff.readUInt32BE(entry + 16),
    data: packedLength < length ? inflateSync(packed) : packed,
  };
}
