export const fileKinds = [
  'tiff',
  'png',
  'jpeg',
  'pnm',
  'fits',
  'gif',
  'bmp',
  'heic',
  'webp',
  'raw',
  'unknown',
] as const;
export type FileKind = (typeof fileKinds)[number];

/** The kind of a file from its first bytes alone; names and declared types are not looked at. */
export function sniffFormat(bytes: Buffer): FileKind {
  if (bytes.length < 12) return 'unknown';
  const ascii = (from: number, to: number) => bytes.toString('latin1', from, to);
  const head = bytes.readUInt32BE(0);
  if (head === 0x49492a00 || head === 0x4d4d002a) return ascii(8, 10) === 'CR' ? 'raw' : 'tiff';
  if (head === 0x49492b00 || head === 0x4d4d002b) return 'tiff';
  if (head === 0x89504e47 && bytes.readUInt32BE(4) === 0x0d0a1a0a) return 'png';
  if (head >>> 8 === 0xffd8ff) return 'jpeg';
  if (/^P[1-6][\s#]/.test(ascii(0, 3))) return 'pnm';
  if (ascii(0, 9) === 'SIMPLE  =') return 'fits';
  if (ascii(0, 4) === 'GIF8') return 'gif';
  if (ascii(0, 2) === 'BM') return 'bmp';
  if (ascii(4, 8) === 'ftyp') return 'heic';
  if (ascii(0, 4) === 'RIFF' && ascii(8, 12) === 'WEBP') return 'webp';
  if (ascii(0, 4) === 'IIU\0' || ascii(0, 4) === 'IIRO' || ascii(0, 8) === 'FUJIFILM' || ascii(6, 10) === 'HEAP')
    return 'raw';
  return 'unknown';
}
