import sharp from 'sharp';
import { chooseChannel } from './chooseChannel';
import type { StoredSamples } from './DecodedFrame';
import { FrameProblem } from './FrameProblem';
import { checkDimensions, MAX_PIXELS } from './limits';

sharp.cache(false);
sharp.concurrency(1);

export interface SharpKind {
  name: 'TIFF' | 'PNG' | 'JPEG';
  exposureMs: number | null;
}

/**
 * Decodes 8- or 16-bit grey or RGB pixels. For 16 bits the colour space must be named before `raw({depth: 'ushort'})`,
 * else 8-bit values are handed out in 16-bit containers. Embedded colour profiles are not applied and orientation tags
 * are never followed: coordinates are those of the stored pixels.
 * @throws FrameProblem when the decoder refuses the file
 */
export async function readWithSharp(bytes: Buffer, kind: SharpKind): Promise<StoredSamples> {
  const open = () =>
    sharp(bytes, { limitInputPixels: MAX_PIXELS, failOn: 'error', ignoreIcc: true, autoOrient: false, pages: 1 });
  try {
    const about = await open().metadata();
    const wide = about.depth === 'ushort';
    if (!wide && about.depth !== 'uchar') {
      throw new FrameProblem(
        'unsupported',
        `${kind.name} samples of type ${about.depth} are not read. Send 8- or 16-bit samples.`,
      );
    }
    const channels = about.channels;
    if (about.space === 'cmyk' || channels > 4) {
      throw new FrameProblem(
        'unsupported',
        `A ${kind.name} with ${channels} channels is not measured. Send a grey frame of 16 bits.`,
      );
    }
    checkDimensions(about.width, about.height, 1, bytes.length, true);
    const colour = channels >= 3;
    const space = wide ? (colour ? 'rgb16' : 'grey16') : colour ? 'srgb' : 'b-w';
    const { data, info } = await open()
      .toColourspace(space)
      .raw({ depth: wide ? 'ushort' : 'uchar' })
      .toBuffer({ resolveWithObject: true });
    const samples = wide
      ? new Uint16Array(data.buffer, data.byteOffset, data.byteLength / 2)
      : new Uint8Array(data.buffer, data.byteOffset, data.byteLength);
    const pixels = info.width * info.height;
    if (samples.length !== pixels * info.channels) {
      throw new FrameProblem('unreadable', `The ${kind.name} could not be decoded whole. Send it again.`);
    }
    const chosen = chooseChannel(samples, pixels, info.channels);
    return {
      format: `${kind.name}, ${wide ? 16 : 8}-bit${chosen.colour ? ' colour' : ''}`,
      widthPx: info.width,
      heightPx: info.height,
      data: chosen.data,
      storedBits: wide ? 16 : 8,
      exposureMs: kind.exposureMs,
      blackCount: null,
      whiteCount: null,
      mosaic: null,
      rendered: kind.name === 'JPEG' || (chosen.colour && !wide),
      notes: chosen.note === null ? [] : [chosen.note],
    };
  } catch (error) {
    if (error instanceof FrameProblem) throw error;
    const said = error instanceof Error ? (error.message.split('\n')[0] ?? '') : '';
    if (/pixel limit/i.test(said)) {
      throw new FrameProblem(
        'too-large',
        `The ${kind.name} declares more pixels than are decoded (${MAX_PIXELS / 1e6} megapixels). Send a region around the pattern.`,
      );
    }
    throw new FrameProblem(
      'unreadable',
      `The ${kind.name} is damaged or cut off and could not be decoded. Send the file again as the camera stored it.`,
    );
  }
}
