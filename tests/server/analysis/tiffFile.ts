/** Entries of a TIFF directory: tag, type (3 short, 4 long), values. */
type Entry = [tag: number, type: 3 | 4, values: number[]];

export interface TiffFile {
  widthPx: number;
  heightPx: number;
  bits: number;
  littleEndian: boolean;
  /** Packed rows as they go into the file. */
  pixels: Buffer;
  /** Rows of one strip; all of them when left out. */
  rowsPerStrip?: number;
  /** Of one strip; needed with more than one. */
  stripBytes?: number;
  photometric?: number;
  orientation?: number;
  more?: Entry[];
}

/** A TIFF written by hand, for kinds that the image library does not write. */
export function tiffFile(file: TiffFile): Buffer {
  const { littleEndian, pixels } = file;
  const rows = file.rowsPerStrip ?? file.heightPx;
  const strips = Math.ceil(file.heightPx / rows);
  const each = file.stripBytes ?? pixels.length;
  const lengths = Array.from({ length: strips }, (_, s) => Math.min(each, pixels.length - s * each));
  const offsets = lengths.map((_, s) => 8 + s * each);
  const entries: Entry[] = [
    [256, 4, [file.widthPx]],
    [257, 4, [file.heightPx]],
    [258, 3, [file.bits]],
    [259, 3, [1]],
    [262, 3, [file.photometric ?? 1]],
    [273, 4, offsets],
    [274, 3, [file.orientation ?? 1]],
    [277, 3, [1]],
    [278, 4, [rows]],
    [279, 4, lengths],
    ...(file.more ?? []),
  ];
  entries.sort((a, b) => a[0] - b[0]);
  const directoryAt = 8 + pixels.length + (pixels.length % 2);
  const directory = Buffer.alloc(2 + entries.length * 12 + 4);
  const extra: Buffer[] = [];
  let extraAt = directoryAt + directory.length;
  const u16 = (buffer: Buffer, value: number, at: number) =>
    littleEndian ? buffer.writeUInt16LE(value, at) : buffer.writeUInt16BE(value, at);
  const u32 = (buffer: Buffer, value: number, at: number) =>
    littleEndian ? buffer.writeUInt32LE(value, at) : buffer.writeUInt32BE(value, at);
  u16(directory, entries.length, 0);
  entries.forEach(([tag, type, values], e) => {
    const at = 2 + e * 12;
    const size = type === 3 ? 2 : 4;
    u16(directory, tag, at);
    u16(directory, type, at + 2);
    u32(directory, values.length, at + 4);
    const inline = values.length * size <= 4;
    const target = inline ? directory : Buffer.alloc(values.length * size);
    values.forEach((value, k) =>
      size === 2
        ? u16(target, value, (inline ? at + 8 : 0) + k * 2)
        : u32(target, value, (inline ? at + 8 : 0) + k * 4),
    );
    if (!inline) {
      u32(directory, extraAt, at + 8);
      extra.push(target);
      extraAt += target.length;
    }
  });
  const head = Buffer.alloc(8);
  head.write(littleEndian ? 'II' : 'MM', 'latin1');
  u16(head, 42, 2);
  u32(head, directoryAt, 4);
  return Buffer.concat([head, pixels, Buffer.alloc(pixels.length % 2), directory, ...extra]);
}
