import QRCode from 'qrcode';

/**
 * The QR code of a text as rows of modules, dark where true, without the quiet zone.
 * Level Q: a quarter of it may be smudged (ISO/IEC 18004).
 */
export function codeModules(text: string): readonly (readonly boolean[])[] {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: 'Q' });
  return Array.from({ length: modules.size }, (_, row) =>
    Array.from({ length: modules.size }, (__, column) => modules.get(row, column) === 1),
  );
}
