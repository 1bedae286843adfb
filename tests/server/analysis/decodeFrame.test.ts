import sharp from 'sharp';
import { decodeFrame } from '../../../server/analysis/decode/decodeFrame';
import { FrameProblem } from '../../../server/analysis/decode/FrameProblem';
import { tiffFile } from './tiffFile';

const WIDTH = 67;
const HEIGHT = 43;
/** Every pixel of its own value, over the whole range of the bits, no pixel equal to its neighbour. */
const ramp = (bits: number) =>
  Uint16Array.from({ length: WIDTH * HEIGHT }, (_, i) => ((i * 7919) % (2 ** bits - 1)) + (i === 0 ? 0 : 1));
const raw16 = (data: Uint16Array) =>
  sharp(data, { raw: { width: WIDTH, height: HEIGHT, channels: 1 } }).toColourspace('grey16');
const bigEndian = (data: Uint16Array) => {
  const buffer = Buffer.alloc(data.length * 2);
  data.forEach((value, i) => buffer.writeUInt16BE(value, 2 * i));
  return buffer;
};
const littleEndian = (data: Uint16Array) => Buffer.from(new Uint16Array(data).buffer);
const problemOf = async (bytes: Buffer) => {
  const outcome = await decodeFrame(bytes, {}).catch((error: unknown) => error);
  expect(outcome).toBeInstanceOf(FrameProblem);
  return outcome as FrameProblem;
};

describe('16 bits come through exactly, every pixel', () => {
  const data = ramp(16);
  const tiffs: [string, sharp.TiffOptions][] = [
    ['strips, none', { compression: 'none' }],
    ['strips, LZW', { compression: 'lzw', predictor: 'none' }],
    ['strips, LZW with predictor', { compression: 'lzw', predictor: 'horizontal' }],
    ['strips, deflate', { compression: 'deflate', predictor: 'horizontal' }],
    ['tiles, none', { compression: 'none', tile: true, tileWidth: 32, tileHeight: 16 }],
    ['tiles, deflate', { compression: 'deflate', tile: true, tileWidth: 32, tileHeight: 32 }],
  ];

  test.each(tiffs)('TIFF: %s', async (_, options) => {
    const decoded = await decodeFrame(await raw16(data).tiff(options).toBuffer(), {});
    expect(decoded).toMatchObject({ widthPx: WIDTH, heightPx: HEIGHT, bitDepth: 16, rendered: false, mosaic: null });
    expect(decoded.data).toEqual(data);
  });

  test.each([true, false])('TIFF written by hand in several strips, little-endian %s', async (little) => {
    const pixels = little ? littleEndian(data) : bigEndian(data);
    const file = tiffFile({
      widthPx: WIDTH,
      heightPx: HEIGHT,
      bits: 16,
      littleEndian: little,
      pixels,
      rowsPerStrip: 10,
      stripBytes: 10 * WIDTH * 2,
    });
    expect((await decodeFrame(file, {})).data).toEqual(data);
  });

  test('PNG', async () => {
    expect((await decodeFrame(await raw16(data).png().toBuffer(), {})).data).toEqual(data);
  });

  test('graymap, with comments in its header', async () => {
    const file = Buffer.concat([
      Buffer.from(`P5\n# a comment\n${WIDTH} ${HEIGHT}\n# and one more\n65535\n`),
      bigEndian(data),
    ]);
    expect((await decodeFrame(file, {})).data).toEqual(data);
  });

  test('FITS with an offset of 32 768, first stored row on top', async () => {
    const card = (text: string) => text.padEnd(80);
    const header = [
      'SIMPLE  =                    T',
      'BITPIX  =                   16',
      'NAXIS   =                    2',
      `NAXIS1  = ${WIDTH}`,
      `NAXIS2  = ${HEIGHT}`,
      'BZERO   =                32768',
      'BSCALE  =                    1',
      'EXPTIME = 0.025 / s',
      'END',
    ]
      .map(card)
      .join('')
      .padEnd(2880);
    const pixels = Buffer.alloc(Math.ceil((data.length * 2) / 2880) * 2880);
    data.forEach((value, i) => pixels.writeInt16BE(value - 32_768, 2 * i));
    const decoded = await decodeFrame(Buffer.concat([Buffer.from(header, 'latin1'), pixels]), {});
    expect(decoded.data).toEqual(data);
    expect(decoded.exposureMs).toBeCloseTo(25);
  });
});

describe('8 bits', () => {
  const data = ramp(8);
  const raw8 = () =>
    sharp(Buffer.from(Uint8Array.from(data)), { raw: { width: WIDTH, height: HEIGHT, channels: 1 } }).toColourspace(
      'b-w',
    );

  test('TIFF and PNG come through exactly', async () => {
    for (const bytes of [await raw8().tiff({ compression: 'lzw' }).toBuffer(), await raw8().png().toBuffer()]) {
      const decoded = await decodeFrame(bytes, {});
      expect(decoded.data).toEqual(data);
      expect(decoded.bitDepth).toBe(8);
    }
  });

  test('a JPEG is taken as rendered by the camera', async () => {
    const bytes = await raw8().jpeg({ quality: 100 }).toBuffer();
    const decoded = await decodeFrame(bytes, {});
    expect(decoded.rendered).toBe(true);
    expect(decoded).toMatchObject({ widthPx: WIDTH, heightPx: HEIGHT });
  });

  test('of a colour picture the channel that responds to the laser is taken, and that is said', async () => {
    const rgb = Buffer.alloc(WIDTH * HEIGHT * 3);
    for (let i = 0; i < WIDTH * HEIGHT; i++) {
      rgb[3 * i] = data[i];
      rgb[3 * i + 1] = data[i] >> 3;
      rgb[3 * i + 2] = 2;
    }
    const decoded = await decodeFrame(
      await sharp(rgb, { raw: { width: WIDTH, height: HEIGHT, channels: 3 } })
        .png()
        .toBuffer(),
      {},
    );
    expect(decoded.data).toEqual(data);
    expect(decoded.notes.join(' ')).toContain('red channel');
  });

  test('grey stored as colour is one plane', async () => {
    const rgb = Buffer.alloc(WIDTH * HEIGHT * 3);
    data.forEach((value, i) => rgb.fill(value, 3 * i, 3 * i + 3));
    const decoded = await decodeFrame(
      await sharp(rgb, { raw: { width: WIDTH, height: HEIGHT, channels: 3 } })
        .tiff({ compression: 'none' })
        .toBuffer(),
      {},
    );
    expect(decoded.data).toEqual(data);
    expect(decoded.rendered).toBe(false);
  });
});

describe('significant bits', () => {
  const data = ramp(12);

  test('at the low end of 16', async () => {
    const decoded = await decodeFrame(await raw16(data).png().toBuffer(), { bitDepth: 12 });
    expect(decoded.bitDepth).toBe(12);
    expect(decoded.data).toEqual(data);
  });

  test.each([{ bitDepth: 12 }, {}])('at the high end of 16, with the record %j', async (camera) => {
    const decoded = await decodeFrame(
      await raw16(data.map((v) => v << 4))
        .png()
        .toBuffer(),
      camera,
    );
    expect(decoded.bitDepth).toBe(12);
    expect(decoded.data).toEqual(data);
    expect(decoded.notes.join(' ')).toContain('high end');
  });

  test('packed, 12 bits, most significant first', async () => {
    const rowBytes = Math.ceil((WIDTH * 12) / 8);
    const pixels = Buffer.alloc(rowBytes * HEIGHT);
    data.forEach((value, i) => {
      const bit = (i % WIDTH) * 12;
      const at = Math.floor(i / WIDTH) * rowBytes + (bit >> 3);
      if (bit % 8 === 0) {
        pixels[at] = value >> 4;
        pixels[at + 1] |= (value & 15) << 4;
      } else {
        pixels[at] |= value >> 8;
        pixels[at + 1] = value & 255;
      }
    });
    const file = tiffFile({ widthPx: WIDTH, heightPx: HEIGHT, bits: 12, littleEndian: true, pixels });
    expect((await decodeFrame(file, {})).data).toEqual(data);
  });
});

test('a mosaic keeps its samples, its phase, its black and its white level', async () => {
  const data = ramp(14);
  const file = tiffFile({
    widthPx: WIDTH,
    heightPx: HEIGHT,
    bits: 16,
    littleEndian: true,
    pixels: littleEndian(data),
    photometric: 32_803,
    more: [
      [254, 4, [0]],
      [33_421, 3, [2, 2]],
      [33_422, 3, [1, 2, 0, 1]],
      [50_714, 3, [250]],
      [50_717, 4, [16_000]],
    ],
  });
  const decoded = await decodeFrame(file, {});
  expect(decoded).toMatchObject({ mosaic: 'gbrg', blackCount: 250, whiteCount: 16_000 });
  expect(decoded.data).toEqual(data);
});

test('orientation tags are not applied: coordinates are those of the stored pixels', async () => {
  const data = ramp(16);
  const file = tiffFile({
    widthPx: WIDTH,
    heightPx: HEIGHT,
    bits: 16,
    littleEndian: true,
    pixels: littleEndian(data),
    orientation: 6,
  });
  const decoded = await decodeFrame(file, {});
  expect(decoded).toMatchObject({ widthPx: WIDTH, heightPx: HEIGHT });
  expect(decoded.data).toEqual(data);
});

describe('what cannot be used is refused in words', () => {
  const tiff = (more: Partial<Parameters<typeof tiffFile>[0]> = {}) =>
    tiffFile({
      widthPx: WIDTH,
      heightPx: HEIGHT,
      bits: 16,
      littleEndian: true,
      pixels: littleEndian(ramp(16)),
      ...more,
    });

  test('an empty file, a text, a HEIC picture, a GIF', async () => {
    expect(await problemOf(Buffer.alloc(0))).toMatchObject({ reason: 'unreadable' });
    expect(await problemOf(Buffer.from('not a picture at all, only text'))).toMatchObject({ reason: 'unsupported' });
    const heic = await problemOf(Buffer.from('\0\0\0\x18ftypheic\0\0\0\0mif1heic', 'latin1'));
    expect(heic).toMatchObject({ reason: 'unsupported' });
    expect(heic.message).toMatch(/JPEG|DNG/);
    expect(await problemOf(Buffer.from('GIF89a\x01\0\x01\0\0\0\0;', 'latin1'))).toMatchObject({
      reason: 'unsupported',
    });
  });

  test('files that are cut off', async () => {
    const whole = await raw16(ramp(16)).png().toBuffer();
    expect(await problemOf(whole.subarray(0, whole.length / 2))).toMatchObject({ reason: 'unreadable' });
    const jpeg = await raw16(ramp(16)).toColourspace('b-w').jpeg().toBuffer();
    expect(await problemOf(jpeg.subarray(0, jpeg.length / 2))).toMatchObject({ reason: 'unreadable' });
    expect(await problemOf(tiff().subarray(0, 4000))).toMatchObject({ reason: 'unreadable' });
    expect(await problemOf(Buffer.from('P5\n400 400\n65535\nabc'))).toMatchObject({ reason: 'unreadable' });
  });

  test('declared sizes that the file does not hold or that nothing could', async () => {
    expect(await problemOf(tiff({ heightPx: 4000 }))).toMatchObject({ reason: 'unreadable' });
    expect(await problemOf(tiff({ widthPx: 60_000, heightPx: 60_000 }))).toMatchObject({ reason: 'too-large' });
    const png = await raw16(ramp(16)).png().toBuffer();
    png.writeUInt32BE(300_000, 16);
    png.writeUInt32BE(300_000, 20);
    expect(await problemOf(png)).toMatchObject({ reason: 'too-large' });
  });

  test('a directory that points at itself ends', async () => {
    const file = tiff();
    const at = file.readUInt32LE(4);
    file.writeUInt32LE(at, at + 2 + file.readUInt16LE(at) * 12);
    expect((await decodeFrame(file, {})).data).toEqual(ramp(16));
  });

  test('floating point, signs and one bit say what to send', async () => {
    for (const more of [
      [339, 3, [3]],
      [339, 3, [2]],
    ] as [number, 3, number[]][]) {
      const problem = await problemOf(tiff({ more: [more] }));
      expect(problem.reason).toBe('unsupported');
      expect(problem.message).toContain('Send');
    }
    expect(await problemOf(tiff({ bits: 1 }))).toMatchObject({ reason: 'unsupported' });
  });
});
