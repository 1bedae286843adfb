import { crc32, deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { measureCaseSchema } from '../../../shared/contracts/measureCase';
import { measure } from '../../../server/analysis/measure';
import { tiffFile } from './tiffFile';

const SIDE = 48;
const ramp = Uint16Array.from({ length: SIDE * SIDE }, (_, i) => (i * 7919) % 65_521);
const chunk = (name: string, data: Buffer, { crc, length }: { crc?: number; length?: number } = {}) => {
  const named = Buffer.concat([Buffer.from(name, 'latin1'), data]);
  const head = Buffer.alloc(4);
  head.writeUInt32BE(length ?? data.length);
  const tail = Buffer.alloc(4);
  tail.writeUInt32BE(crc ?? crc32(named));
  return Buffer.concat([head, named, tail]);
};
const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10]);
const header = (widthPx: number, heightPx: number, bits = 8, colour = 0) => {
  const data = Buffer.alloc(13);
  data.writeUInt32BE(widthPx, 0);
  data.writeUInt32BE(heightPx, 4);
  data[8] = bits;
  data[9] = colour;
  return chunk('IHDR', data);
};
/** Rows of one filter byte and eight-bit samples. */
const rows = deflateSync(Buffer.alloc(SIDE * (SIDE + 1), 0).map((_, i) => (i % (SIDE + 1) === 0 ? 0 : i % 251)));
const END = chunk('IEND', Buffer.alloc(0));
const png = (...chunks: Buffer[]) => Buffer.concat([SIGNATURE, ...chunks]);
const wrongSum = Buffer.from(rows);
wrongSum[wrongSum.length - 1] ^= 0xff;
const noise = Buffer.from(Uint8Array.from({ length: 3000 }, (_, i) => (i * i * 31 + i * 17) % 256));

const tiff = (more: Partial<Parameters<typeof tiffFile>[0]> = {}) =>
  tiffFile({
    widthPx: SIDE,
    heightPx: SIDE,
    bits: 16,
    littleEndian: true,
    pixels: Buffer.from(ramp.buffer),
    ...more,
  });
/** The same file with the value of one entry's field overwritten: 2 type, 4 count, 8 value. */
const withField = (file: Buffer, tag: number, field: 2 | 4 | 8, value: number) => {
  const at = file.readUInt32LE(4);
  for (let entry = at + 2; entry < at + 2 + 12 * file.readUInt16LE(at); entry += 12) {
    if (file.readUInt16LE(entry) !== tag) continue;
    if (field === 2) file.writeUInt16LE(value, entry + field);
    else file.writeUInt32LE(value, entry + field);
  }
  return file;
};
const fits = (...cards: string[]) =>
  Buffer.concat([
    Buffer.from(
      ['SIMPLE  =                    T', 'BITPIX  =                   16', ...cards]
        .map((card) => card.padEnd(80))
        .join('')
        .padEnd(2880),
      'latin1',
    ),
    Buffer.alloc(2 * 2880),
  ]);
/** An EXIF block whose one entry states four thousand million values, or whose directory points at itself. */
const exif = (count: number, next: number) => {
  const block = Buffer.alloc(26);
  block.write('II*\0', 'latin1');
  block.writeUInt32LE(8, 4);
  block.writeUInt16LE(1, 8);
  block.writeUInt16LE(33_434, 10);
  block.writeUInt16LE(5, 12);
  block.writeUInt32LE(count, 14);
  block.writeUInt32LE(8, 18);
  block.writeUInt32LE(next, 22);
  const body = Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), block]);
  const head = Buffer.from([0xff, 0xe1, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([head, body]);
};
const jpeg = () =>
  sharp(Buffer.from(Uint8Array.from(ramp)), { raw: { width: SIDE, height: SIDE, channels: 1 } })
    .jpeg()
    .toBuffer();
const withSegment = (file: Buffer, segment: Buffer) => Buffer.concat([file.subarray(0, 2), segment, file.subarray(2)]);

const files: [what: string, make: () => Buffer | Promise<Buffer>][] = [
  ['PNG: wrong check sum of a chunk', () => png(header(SIDE, SIDE), chunk('IDAT', rows, { crc: 1 }), END)],
  ['PNG: wrong check sum of the packed rows', () => png(header(SIDE, SIDE), chunk('IDAT', wrongSum), END)],
  ['PNG: noise for packed rows', () => png(header(SIDE, SIDE), chunk('IDAT', noise), END)],
  ['PNG: rows longer than the file', () => png(header(SIDE, SIDE), chunk('IDAT', rows, { length: 0x7fffffff }))],
  [
    'PNG: an unknown chunk of 2 GB',
    () => png(header(SIDE, SIDE), chunk('juNk', noise, { length: 0x7ffffff0 }), chunk('IDAT', rows), END),
  ],
  ['PNG: far too wide and high', () => png(header(0xffffffff, 0x20007fe0), chunk('IDAT', rows), END)],
  ['PNG: 400 megapixels', () => png(header(20_000, 20_000), chunk('IDAT', rows), END)],
  ['PNG: 90 megapixels in 200 bytes', () => png(header(9500, 9500, 16), chunk('IDAT', rows), END)],
  ['PNG: no rows at all', () => png(header(SIDE, SIDE), END)],
  ['PNG: cut within its header', () => png(header(SIDE, SIDE)).subarray(0, 20)],
  ['PNG: palette without colours', () => png(header(SIDE, SIDE, 8, 3), chunk('IDAT', rows), END)],
  ['JPEG: cut off', async () => (await jpeg()).subarray(0, 400)],
  ['JPEG: segment longer than the file', async () => withSegment(await jpeg(), Buffer.from([0xff, 0xe5, 0xff, 0xff]))],
  ['JPEG: segment of no length', async () => withSegment(await jpeg(), Buffer.from([0xff, 0xe5, 0, 0]))],
  ['JPEG: scan before the frame', () => Buffer.from('ffd8ffda0008010100003f00' + '55'.repeat(500), 'hex')],
  ['JPEG: EXIF entry of 4 000 000 000 values', async () => withSegment(await jpeg(), exif(0xf0000000, 0))],
  ['JPEG: EXIF directory that points at itself', async () => withSegment(await jpeg(), exif(1, 8))],
  ['TIFF: no width and no height', () => tiff({ widthPx: 0, heightPx: 0 })],
  ['TIFF: 4 000 000 000 pixels wide', () => tiff({ widthPx: 4_000_000_000 })],
  ['TIFF: strips beyond the end', () => withField(tiff(), 273, 8, 0x7fffff00)],
  ['TIFF: strips of no bytes', () => withField(tiff(), 279, 8, 0)],
  [
    'TIFF of 12 bits: strips of no bytes (cut off)',
    () => withField(tiff({ bits: 12, pixels: Buffer.alloc(1.5 * SIDE * SIDE, 0x5a) }), 279, 8, 0),
  ],
  [
    'TIFF of 12 bits: strips beyond the end',
    () => withField(tiff({ bits: 12, pixels: Buffer.alloc(1.5 * SIDE * SIDE, 0x5a) }), 273, 8, 0x7fffff00),
  ],
  ['TIFF: 4 000 000 000 strips', () => withField(tiff(), 273, 4, 0xf0000000)],
  ['TIFF: no rows in a strip', () => withField(tiff(), 278, 8, 0)],
  ['TIFF: 60 000 samples a pixel', () => withField(tiff(), 277, 8, 60_000)],
  ['TIFF: entries of an unknown type', () => withField(tiff(), 256, 2, 99)],
  ['TIFF: noise packed by LZW', () => withField(tiff({ pixels: noise }), 259, 8, 5)],
  ['TIFF: noise packed by deflate', () => withField(tiff({ pixels: noise }), 259, 8, 8)],
  ['TIFF: noise packed by JPEG', () => withField(tiff({ pixels: noise }), 259, 8, 7)],
  ['TIFF: sub-directory that is the directory itself', () => tiff({ more: [[330, 4, [8 + 2 * SIDE * SIDE]]] })],
  ['TIFF: directory beyond the end', () => Buffer.from('49492a00ffffff7f0000000000000000', 'hex')],
  ['TIFF: header alone', () => Buffer.from('4d4d002a00000008', 'hex')],
  ['TIFF: of the 64-bit kind', () => Buffer.from('49492b0008000000100000000000000000000000', 'hex')],
  ['FITS: no axes', () => fits('NAXIS   =                    0', 'END')],
  ['FITS: no width', () => fits('NAXIS   = 2', 'NAXIS1  = 0', 'NAXIS2  = 48', 'END')],
  ['FITS: width that is no number', () => fits('NAXIS   = 2', 'NAXIS1  = 1E400', 'NAXIS2  = -48', 'END')],
  ['FITS: header without an end', () => fits('NAXIS   = 2', 'NAXIS1  = 48', 'NAXIS2  = 48')],
  ['FITS: larger than the file', () => fits('NAXIS   = 2', 'NAXIS1  = 9000', 'NAXIS2  = 9000', 'END')],
  ['graymap: width below zero', () => Buffer.from('P5\n-48 48\n255\n' + 'a'.repeat(3000), 'latin1')],
  ['graymap: white level of 0', () => Buffer.from('P5\n48 48\n0\n' + 'a'.repeat(3000), 'latin1')],
  ['graymap: 99 999 999 pixels a side', () => Buffer.from('P5\n99999999 99999999\n255\nabc', 'latin1')],
  ['graymap: nothing but a comment', () => Buffer.from('P5\n#' + 'a'.repeat(5000), 'latin1')],
  ['GIF: 65 535 pixels a side in 44 bytes', () => Buffer.from('GIF89a\xff\xff\xff\xff\x80\0\0'.padEnd(44), 'latin1')],
  ['BMP: width below zero', () => Buffer.from('BM' + '\xff'.repeat(80), 'latin1')],
  ['noise', () => noise],
];

const measureCase = measureCaseSchema.parse({
  id: 'damaged',
  frame: 'damaged',
  pattern: 'auto',
  wavelengthNm: 632.8,
  distanceMm: 100,
  pixelPitchUm: 3.45,
});

test.each(files)('%s', async (what, make) => {
  const bytes = await make();
  const before = process.memoryUsage().rss;
  const began = performance.now();
  const { result } = await measure(measureCase, { frames: [bytes], darks: [], flats: [] });
  expect(performance.now() - began).toBeLessThan(5000);
  expect((process.memoryUsage().rss - before) / 2 ** 20).toBeLessThan(200);
  // The pixels of a file whose description alone is damaged may be read; they hold no pattern of a pinhole.
  expect(['failed', 'refused']).toContain(result.status);
  if (/check sum|noise|beyond|cut off|no rows|larger/.test(what)) expect(result.status).toBe('failed');
  expect((result as { message: string }).message).toMatch(/[Ss]end|Check|Convert/);
});
