import type { DecodedFrame, StoredSamples } from './DecodedFrame';

/**
 * Settles how many bits are significant and brings them to the low end. A camera of 12 bits may store its counts at the
 * low end of 16 (0 to 4095) or at the high end (multiples of 16); the file is asked, not the record: when every sample
 * has the same zero bits at its low end, those were padding. Samples whose low bits repeat the high ones (a widened
 * scale) are not undone.
 * @param recordBits significant bits by the camera record, if it says so
 */
export function settleBits(stored: StoredSamples, recordBits: number | undefined): DecodedFrame {
  if (stored.storedBits > 16 || !(stored.data instanceof Uint16Array)) {
    return { ...stored, bitDepth: recordBits ?? 32 };
  }
  const { data, storedBits } = stored;
  let used = 0;
  let top = 0;
  for (let i = 0; i < data.length; i++) {
    const value = data[i];
    used |= value;
    if (value > top) top = value;
  }
  let padding = 0;
  if (used !== 0) while (((used >> padding) & 1) === 0) padding++;
  const possible = recordBits === undefined ? padding : Math.min(padding, Math.max(0, storedBits - recordBits));
  // A handful of zero bits can come about by chance in a frame of few distinct values: 2 bits or more are needed.
  const shift = recordBits === undefined && padding < 2 ? 0 : possible;
  const notes = [...stored.notes];
  if (shift > 0) {
    for (let i = 0; i < data.length; i++) data[i] >>= shift;
    notes.push(
      `The significant bits lay at the high end of ${storedBits}-bit samples; ${shift} empty low bits were taken off.`,
    );
  }
  const needed = Math.max(1, 32 - Math.clz32(top >> shift));
  let bitDepth = recordBits ?? storedBits - shift;
  if (recordBits === undefined && shift === 0 && storedBits === 16) {
    bitDepth = Math.max(8, needed + (needed % 2));
    if (bitDepth < 16)
      notes.push(`The brightest sample needs ${needed} bits; ${bitDepth} significant bits were assumed.`);
  }
  if (recordBits !== undefined && needed > recordBits) {
    bitDepth = needed;
    notes.push(`The camera record says ${recordBits} bits, but the samples need ${needed}.`);
  }
  const scale = 2 ** shift;
  return {
    ...stored,
    bitDepth,
    blackCount: stored.blackCount === null ? null : stored.blackCount / scale,
    whiteCount: stored.whiteCount === null ? null : Math.floor(stored.whiteCount / scale),
    notes,
  };
}
