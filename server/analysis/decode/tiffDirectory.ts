import { FrameProblem } from './FrameProblem';

/** One image file directory: values by tag. Text tags hold one string. */
export interface TiffDirectory {
  numbers: Map<number, number[]>;
  texts: Map<number, string>;
}

const TYPE_BYTES = [0, 1, 1, 2, 4, 8, 1, 1, 2, 4, 8, 4, 8, 4];
/** Directories that a file may hold before it is taken for a loop. */
const MAX_DIRECTORIES = 32;
const MAX_ENTRIES = 512;
/** Values of one entry that are read: strip tables of the tallest frames fit. */
const MAX_VALUES = 200_000;

const SUB_DIRECTORIES = 330;
const EXIF_DIRECTORY = 34665;

/**
 * Reads the directories of a TIFF structure with bounded work: no recursion without limit, no directory twice, no
 * allocation that the file's own length does not back. Source: TIFF revision 6.0, section 2 (from memory).
 * @param bytes the structure from its byte-order mark on (a whole TIFF, or the EXIF block of a JPEG)
 * @returns main directories first, then sub-directories, then the EXIF directory
 * @throws FrameProblem `unreadable` when the structure is broken
 */
export function readTiffDirectories(bytes: Buffer): { littleEndian: boolean; directories: TiffDirectory[] } {
  const littleEndian = bytes.toString('latin1', 0, 2) === 'II';
  const u16 = (at: number) => (littleEndian ? bytes.readUInt16LE(at) : bytes.readUInt16BE(at));
  const u32 = (at: number) => (littleEndian ? bytes.readUInt32LE(at) : bytes.readUInt32BE(at));
  const fits = (at: number, length: number) => at >= 0 && length >= 0 && at + length <= bytes.length;
  if (!fits(0, 8) || u16(2) !== 42) {
    throw new FrameProblem(
      'unsupported',
      'This kind of TIFF (BigTIFF) is not read. Send a plain TIFF of 8 or 16 bits.',
    );
  }
  const seen = new Set<number>();
  const directories: TiffDirectory[] = [];
  const waiting = [u32(4)];
  const inner: number[] = [];

  const value = (type: number, at: number): number => {
    switch (type) {
      case 1:
      case 2:
      case 7:
        return bytes.readUInt8(at);
      case 3:
        return u16(at);
      case 4:
      case 13:
        return u32(at);
      case 5:
        return u32(at) / u32(at + 4);
      case 6:
        return bytes.readInt8(at);
      case 8:
        return littleEndian ? bytes.readInt16LE(at) : bytes.readInt16BE(at);
      case 9:
        return littleEndian ? bytes.readInt32LE(at) : bytes.readInt32BE(at);
      case 10:
        return littleEndian
          ? bytes.readInt32LE(at) / bytes.readInt32LE(at + 4)
          : bytes.readInt32BE(at) / bytes.readInt32BE(at + 4);
      case 11:
        return littleEndian ? bytes.readFloatLE(at) : bytes.readFloatBE(at);
      default:
        return littleEndian ? bytes.readDoubleLE(at) : bytes.readDoubleBE(at);
    }
  };

  while (waiting.length + inner.length > 0) {
    const at = waiting.shift() ?? inner.shift() ?? 0;
    if (at === 0 || seen.has(at)) continue;
    seen.add(at);
    if (seen.size > MAX_DIRECTORIES || !fits(at, 2)) {
      if (directories.length > 0) break;
      throw new FrameProblem(
        'unreadable',
        'The TIFF directory lies outside the file; it seems cut off. Send it again.',
      );
    }
    const count = u16(at);
    if (count === 0 || count > MAX_ENTRIES || !fits(at + 2, count * 12)) {
      if (directories.length > 0) break;
      throw new FrameProblem(
        'unreadable',
        'The TIFF directory is damaged. Send the file again as the camera stored it.',
      );
    }
    const directory: TiffDirectory = { numbers: new Map(), texts: new Map() };
    for (let e = 0; e < count; e++) {
      const entry = at + 2 + e * 12;
      const tag = u16(entry);
      const type = u16(entry + 2);
      const values = u32(entry + 4);
      const size = TYPE_BYTES[type] ?? 0;
      if (size === 0 || values === 0 || values > MAX_VALUES) continue;
      const from = values * size <= 4 ? entry + 8 : u32(entry + 8);
      if (!fits(from, values * size)) continue;
      if (type === 2) {
        directory.texts.set(tag, bytes.toString('latin1', from, from + values).replace(/\0.*$/s, ''));
        continue;
      }
      const numbers: number[] = [];
      for (let k = 0; k < values; k++) numbers.push(value(type, from + k * size));
      directory.numbers.set(tag, numbers);
      if (tag === SUB_DIRECTORIES || tag === EXIF_DIRECTORY) inner.push(...numbers.slice(0, 8));
    }
    directories.push(directory);
    if (fits(at + 2 + count * 12, 4)) waiting.push(u32(at + 2 + count * 12));
  }
  if (directories.length === 0) {
    throw new FrameProblem('unreadable', 'The TIFF holds no image. Send the file again as the camera stored it.');
  }
  return { littleEndian, directories };
}

/** Exposure time in milliseconds from tag 33434, or null. */
export function exposureMsOf(directories: TiffDirectory[]): number | null {
  for (const directory of directories) {
    const seconds = directory.numbers.get(33434)?.[0];
    if (seconds !== undefined && Number.isFinite(seconds) && seconds > 0) return seconds * 1000;
  }
  return null;
}
