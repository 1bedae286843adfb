import type { CameraRecord } from '../../../shared/contracts/measureCase';
import type { DecodedFrame, StoredSamples } from './DecodedFrame';
import { FrameProblem } from './FrameProblem';
import { checkDimensions, MAX_FILE_BYTES } from './limits';
import { readFits } from './readFits';
import { readPnm } from './readPnm';
import { readTiff } from './readTiff';
import { readWithSharp } from './readWithSharp';
import { sniffFormat } from './sniffFormat';
import { exposureMsOf, readTiffDirectories } from './tiffDirectory';

import { settleBits } from './settleBits';

/**
 * Decodes a frame to one plane of counts, by its content alone.
 * @throws FrameProblem with words that say what to send instead
 */
export async function decodeFrame(bytes: Buffer, camera: CameraRecord): Promise<DecodedFrame> {
  if (bytes.length === 0) throw new FrameProblem('unreadable', 'The file is empty. Send it again.');
  if (bytes.length > MAX_FILE_BYTES) {
    throw new FrameProblem(
      'too-large',
      `The file is larger than ${MAX_FILE_BYTES / 1024 / 1024} MB. Send a region of the sensor around the pattern.`,
    );
  }
  return settleBits(await readStored(bytes), camera.bitDepth);
}

async function readStored(bytes: Buffer): Promise<StoredSamples> {
  switch (sniffFormat(bytes)) {
    case 'tiff':
      return readTiff(bytes);
    case 'pnm':
      return readPnm(bytes);
    case 'fits':
      return readFits(bytes);
    case 'png':
      return readPng(bytes);
    case 'jpeg':
      return readWithSharp(bytes, { name: 'JPEG', exposureMs: jpegExposureMs(bytes) });
    case 'heic':
      throw new FrameProblem(
        'unsupported',
        'HEIC pictures are not decoded. Set the phone to store JPEG ("most compatible"), or send its raw DNG.',
      );
    case 'gif':
    case 'bmp':
    case 'webp':
      throw new FrameProblem(
        'unsupported',
        'This picture format is not measured. Send a TIFF or PNG of 8 or 16 bits as the camera stored it.',
      );
    case 'raw':
      throw new FrameProblem(
        'unsupported',
        "This maker's raw format is not decoded. Convert it to an uncompressed DNG or a 16-bit TIFF and send that.",
      );
    default:
      throw new FrameProblem(
        'unsupported',
        'This is no picture format that is known here. Send a TIFF or PNG of 8 or 16 bits as the camera stored it.',
      );
  }
}

function readPng(bytes: Buffer): Promise<StoredSamples> {
  if (bytes.length < 33 || bytes.toString('latin1', 12, 16) !== 'IHDR') {
    throw new FrameProblem('unreadable', 'The PNG header is damaged. Send the file again.');
  }
  const bits = bytes.readUInt8(24);
  const colour = bytes.readUInt8(25);
  if ((bits !== 8 && bits !== 16) || colour === 3) {
    throw new FrameProblem(
      'unsupported',
      'A PNG with a palette or fewer than 8 bits is not measured. Send 8 or 16 bits a sample.',
    );
  }
  checkDimensions(bytes.readUInt32BE(16), bytes.readUInt32BE(20), bits / 8, bytes.length, true);
  return readWithSharp(bytes, { name: 'PNG', exposureMs: null });
}

/** Exposure time from the EXIF block of a JPEG, or null. */
function jpegExposureMs(bytes: Buffer): number | null {
  let at = 2;
  while (at + 4 <= bytes.length && bytes[at] === 0xff) {
    const marker = bytes[at + 1];
    const length = bytes.readUInt16BE(at + 2);
    if (marker === 0xe1 && bytes.toString('latin1', at + 4, at + 8) === 'Exif') {
      try {
        return exposureMsOf(
          readTiffDirectories(bytes.subarray(at + 10, Math.min(bytes.length, at + 2 + length))).directories,
        );
      } catch {
        return null;
      }
    }
    if (marker === 0xda || length < 2) return null;
    at += 2 + length;
  }
  return null;
}
