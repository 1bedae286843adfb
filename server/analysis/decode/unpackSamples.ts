/**
 * Samples of 8 to 16 bits out of packed rows, most significant bit first; rows begin on whole bytes.
 * @param packed rows of ceil(widthPx * bits / 8) bytes
 * @param littleEndian byte order of 16-bit samples; packed samples have none
 * @returns row-major counts, length widthPx * heightPx
 */
export function unpackSamples(
  packed: Uint8Array,
  widthPx: number,
  heightPx: number,
  bits: number,
  littleEndian: boolean,
): Uint16Array {
  const data = new Uint16Array(widthPx * heightPx);
  if (bits === 16) {
    const low = littleEndian ? 0 : 1;
    for (let i = 0; i < data.length; i++) data[i] = (packed[2 * i + low] ?? 0) | ((packed[2 * i + 1 - low] ?? 0) << 8);
    return data;
  }
  const rowBytes = Math.ceil((widthPx * bits) / 8);
  const most = (1 << bits) - 1;
  for (let y = 0; y < heightPx; y++) {
    let at = y * rowBytes;
    let held = 0;
    let have = 0;
    for (let x = 0; x < widthPx; x++) {
      while (have < bits) {
        held = ((held << 8) | (packed[at++] ?? 0)) & 0xffffff;
        have += 8;
      }
      have -= bits;
      data[y * widthPx + x] = (held >> have) & most;
    }
  }
  return data;
}
