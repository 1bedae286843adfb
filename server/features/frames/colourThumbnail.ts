import sharp from 'sharp';
import { ownColourMap, type Theme } from '../../../shared/optics/ownColour';
import type { StoredRendition } from './frameRepository';

/** Layout of a thumbnail's bytes: one tone of 0 to 255 a pixel, row-major, rows from the top. */
export const TONE_ENCODING = 'tone8';

/** A thumbnail's tones as a PNG in the own colour of a wavelength (null: neutral). */
export async function colourThumbnail(
  { widthPx, heightPx, encoding, bytes }: StoredRendition,
  wavelengthNm: number | null,
  theme: Theme,
): Promise<Buffer> {
  if (encoding !== TONE_ENCODING) throw new Error(`A thumbnail is stored as ${encoding}.`);
  const map = ownColourMap(wavelengthNm, theme);
  const colours = Buffer.alloc(bytes.length * 3);
  for (const [index, tone] of bytes.entries()) colours.set(map.subarray(tone * 3, tone * 3 + 3), index * 3);
  return sharp(colours, { raw: { width: widthPx, height: heightPx, channels: 3 } })
    .png({ compressionLevel: 6 })
    .toBuffer();
}
