import type { Mosaic } from '../decode/DecodedFrame';
import { MASK } from './mask';

const NAMES: Record<string, string> = { r: 'red', g: 'green', b: 'blue' };

/**
 * Masks the sites of a colour mosaic that do not respond to the laser. The sites of the colour with the strongest signal
 * stay, at their true positions; nothing is interpolated.
 * @returns the colour that stays, in words
 */
export function maskOtherColours(
  data: Uint16Array | Float32Array,
  mask: Uint8Array,
  widthPx: number,
  heightPx: number,
  mosaic: Mosaic,
): string {
  const range = new Map<string, number>();
  for (const colour of ['r', 'g', 'b']) {
    const some: number[] = [];
    for (let y = 0; y < heightPx; y += 1) {
      for (let x = (y * 3) % 8; x < widthPx; x += 8) {
        for (let dx = 0; dx < 2 && x + dx < widthPx; dx++) {
          if (mosaic[(y % 2) * 2 + ((x + dx) % 2)] === colour) some.push(data[y * widthPx + x + dx]);
        }
      }
    }
    some.sort((a, b) => a - b);
    range.set(colour, some[Math.floor(some.length * 0.999)] - some[Math.floor(some.length * 0.05)]);
  }
  const chosen = [...range].sort((a, b) => b[1] - a[1])[0][0];
  // Two green sites in each cell: only one row's are kept, so that neighbours of one colour lie two pixels apart.
  let greenKept = false;
  const keep = [0, 1, 2, 3].map((site) => {
    if (mosaic[site] !== chosen) return false;
    if (chosen !== 'g') return true;
    if (greenKept) return false;
    greenKept = true;
    return true;
  });
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      if (!keep[(y % 2) * 2 + (x % 2)]) mask[y * widthPx + x] |= MASK.otherColour;
    }
  }
  return NAMES[chosen];
}
