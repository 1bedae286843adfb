import UTIF from 'utif';
import type { Mosaic, StoredSamples } from './DecodedFrame';
import { FrameProblem } from './FrameProblem';
import { checkDimensions } from './limits';
import { readWithSharp } from './readWithSharp';
import { exposureMsOf, readTiffDirectories, type TiffDirectory } from './tiffDirectory';
import { unpackSamples } from './unpackSamples';

const WIDTH = 256;
const HEIGHT = 257;
const BITS = 258;
const COMPRESSION = 259;
const PHOTOMETRIC = 262;
const SAMPLES = 277;
const FORMAT = 339;
const CFA = 32_803;
const LINEAR_RAW = 34_892;
const JPEG = 7;
/** Tags that the decoder for mosaics and odd depths needs. */
const PASSED_TAGS = [
  WIDTH,
  HEIGHT,
  BITS,
  COMPRESSION,
  PHOTOMETRIC,
  266,
  273,
  SAMPLES,
  278,
  279,
  284,
  317,
  322,
  323,
  324,
  325,
];

/**
 * Reads a TIFF, or a DNG with a colour mosaic. Plain grey or RGB samples of 8 or 16 bits go through sharp; mosaics and
 * samples of 10, 12 or 14 bits through utif, which leaves them packed, most significant bit first.
 * Tags: TIFF 6.0; DNG black level 50714, white level 50717, active area 50829, CFA pattern 33422 (looked up: Adobe DNG
 * SDK header).
 * @throws FrameProblem when the file cannot be read as one plane of integer counts
 */
export async function readTiff(bytes: Buffer): Promise<StoredSamples> {
  const { littleEndian, directories } = readTiffDirectories(bytes);
  const exposureMs = exposureMsOf(directories);
  const raw =
    directories.find((d) => d.numbers.get(PHOTOMETRIC)?.[0] === CFA && first(d, 254) === 0) ??
    directories.find((d) => d.numbers.get(PHOTOMETRIC)?.[0] === CFA);
  const directory = raw ?? directories[0];
  const bits = directory.numbers.get(BITS) ?? [1];
  const compression = first(directory, COMPRESSION) ?? 1;
  const samples = first(directory, SAMPLES) ?? 1;
  const widthPx = first(directory, WIDTH) ?? 0;
  const heightPx = first(directory, HEIGHT) ?? 0;
  const format = first(directory, FORMAT) ?? 1;
  checkDimensions(widthPx, heightPx, ((bits[0] ?? 1) * samples) / 8, bytes.length, compression !== 1);
  if (format === 3 || (bits[0] ?? 1) > 16) {
    throw new FrameProblem(
      'unsupported',
      `TIFF samples of ${bits[0]} bits${format === 3 ? ' floating point' : ''} are not read. Send unsigned integers of 16 bits.`,
    );
  }
  if (format === 2)
    throw new FrameProblem('unsupported', 'TIFF samples with a sign are not read. Send unsigned integers of 16 bits.');
  const photometric = first(directory, PHOTOMETRIC);
  if (photometric === LINEAR_RAW || photometric === 6) {
    throw new FrameProblem(
      'unsupported',
      'This file holds a picture that was already developed. Send the raw mosaic, or a 16-bit grey TIFF.',
    );
  }
  if (raw === undefined && (bits[0] === 8 || bits[0] === 16)) {
    return readWithSharp(bytes, { name: 'TIFF', exposureMs });
  }
  if (![8, 10, 12, 14, 16].includes(bits[0] ?? 0) || samples !== 1) {
    throw new FrameProblem(
      'unsupported',
      `A TIFF of ${bits[0]} bits and ${samples} channels is not measured. Send one grey channel of 8 or 16 bits.`,
    );
  }
  return readPacked(bytes, directory, littleEndian, {
    widthPx,
    heightPx,
    bits: bits[0] ?? 16,
    compression,
    exposureMs,
    isMosaic: raw !== undefined,
  });
}

interface PackedKind {
  widthPx: number;
  heightPx: number;
  bits: number;
  compression: number;
  exposureMs: number | null;
  isMosaic: boolean;
}

function readPacked(bytes: Buffer, directory: TiffDirectory, littleEndian: boolean, kind: PackedKind): StoredSamples {
  const { widthPx, heightPx, bits, compression } = kind;
  if (![1, 5, JPEG, 8].includes(compression)) {
    throw new FrameProblem(
      'unsupported',
      `This raw file is compressed in a way that is not read (${compression}). Send an uncompressed or losslessly compressed DNG, or a 16-bit TIFF.`,
    );
  }
  checkStrips(bytes, directory);
  const image: UTIF.IFD = { data: new Uint8Array(0), width: widthPx, height: heightPx };
  for (const tag of PASSED_TAGS) {
    const values = directory.numbers.get(tag);
    if (values) image[`t${tag}`] = values;
  }
  try {
    const copy = bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength);
    UTIF.decodeImage(copy as ArrayBuffer, image);
  } catch {
    throw new FrameProblem(
      'unreadable',
      'The pixels of this file are damaged and could not be decoded. Send it again as the camera stored it.',
    );
  }
  const whole = unpackSamples(image.data, widthPx, heightPx, bits, littleEndian || compression === JPEG);
  const area = directory.numbers.get(50_829);
  const active =
    area?.length === 4 && area[2] <= heightPx && area[3] <= widthPx && area[0] < area[2] && area[1] < area[3]
      ? area
      : [0, 0, heightPx, widthPx];
  const [top, left, bottom, right] = active as [number, number, number, number];
  const data = new Uint16Array((right - left) * (bottom - top));
  for (let y = top; y < bottom; y++)
    data.set(whole.subarray(y * widthPx + left, y * widthPx + right), (y - top) * (right - left));
  applyTable(data, directory.numbers.get(50_712));
  const black = directory.numbers.get(50_714)?.filter((b) => Number.isFinite(b));
  const white = first(directory, 50_717);
  return {
    format: kind.isMosaic ? `DNG, ${bits}-bit mosaic` : `TIFF, ${bits}-bit`,
    widthPx: right - left,
    heightPx: bottom - top,
    data,
    storedBits: 16,
    exposureMs: kind.exposureMs,
    blackCount: black && black.length > 0 ? black.reduce((s, b) => s + b, 0) / black.length : null,
    whiteCount: white !== undefined && white > 0 ? white : null,
    mosaic: kind.isMosaic ? mosaicOf(directory) : null,
    rendered: false,
    notes: [],
  };
}

/** Every strip or tile must hold bytes and lie inside the file. */
function checkStrips(bytes: Buffer, directory: TiffDirectory): void {
  const offsets = directory.numbers.get(273) ?? directory.numbers.get(324) ?? [];
  const lengths = directory.numbers.get(279) ?? directory.numbers.get(325) ?? [];
  const good =
    offsets.length > 0 &&
    offsets.length === lengths.length &&
    lengths.every((length, i) => length > 0 && (offsets[i] ?? Infinity) + length <= bytes.length);
  if (!good) throw new FrameProblem('unreadable', 'The pixels lie outside the file; it seems cut off. Send it again.');
}

/** Linearisation table (tag 50712): stored value to linear count. */
function applyTable(data: Uint16Array, table: number[] | undefined): void {
  if (table === undefined || table.length < 2) return;
  const last = table.length - 1;
  for (let i = 0; i < data.length; i++) data[i] = table[Math.min(data[i], last)] ?? 0;
}

function mosaicOf(directory: TiffDirectory): Mosaic {
  const pattern = directory.numbers.get(33_422)?.join('') ?? '';
  const phases: Record<string, Mosaic> = { '0112': 'rggb', '1021': 'grbg', '1201': 'gbrg', '2110': 'bggr' };
  const phase = phases[pattern];
  if (phase === undefined || (directory.numbers.get(33_421)?.join() ?? '2,2') !== '2,2') {
    throw new FrameProblem(
      'unsupported',
      'The colour mosaic of this file is not a pattern of two by two red, green and blue sites. Send a frame of a monochrome or Bayer camera.',
    );
  }
  return phase;
}

function first(directory: TiffDirectory, tag: number): number | undefined {
  return directory.numbers.get(tag)?.[0];
}
