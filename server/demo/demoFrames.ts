import { createHash } from 'node:crypto';
import sharp from 'sharp';
import type { FrameKind } from '../../shared/contracts/captures';
import { simulateDark } from '../simulator/simulateDark';
import { simulatePinhole } from '../simulator/simulatePinhole';
import { captures, DARKS_PER_CAPTURE } from './demoLaboratory';

/** A frame of the demo as a camera's program would have written it. */
export interface DemoFrame {
  name: string;
  kind: FrameKind;
  bytes: Buffer;
  sha256: string;
}

type DemoCapture = (typeof captures)[number];

/** The frames of a capture: darks first. The same place in the list always gives the same bytes. */
export async function demoFrames(capture: DemoCapture): Promise<DemoFrame[]> {
  const { sensor, laser, revision } = capture.bench;
  const seed = 1000 * (captures.indexOf(capture) + 1);
  const frames: DemoFrame[] = [];
  for (let n = 1; n <= DARKS_PER_CAPTURE; n += 1) {
    frames.push(await frame(`dark-${n}`, 'dark', simulateDark({ sensor, seed: seed + n })));
  }
  const white = sensor.whiteCount ?? 2 ** sensor.bitDepth - 1;
  const fullElectrons = (white - sensor.blackCount) * sensor.electronsPerCount;
  for (const [at, { exposure }] of capture.lights.entries()) {
    const { light } = simulatePinhole({
      sensor,
      diameterUm: capture.diameterUm,
      wavelengthNm: laser.wavelengthNm,
      distanceMm: revision.distanceMm,
      centrePx: { x: sensor.widthPx / 2 + 21.4 - 3.1 * at, y: sensor.heightPx / 2 - 13.7 + 2.3 * at },
      peakElectrons: exposure * fullElectrons,
      backgroundElectrons: exposure > 0 ? 20 : 0,
      seed: seed + 100 + at,
    });
    frames.push(await frame(`${at + 1}`, 'light', light));
  }
  return frames;

  async function frame(end: string, kind: FrameKind, counts: Uint16Array): Promise<DemoFrame> {
    const raw = { width: sensor.widthPx, height: sensor.heightPx, channels: 1 } as const;
    const bytes = await sharp(counts, { raw }).toColourspace('grey16').tiff({ compression: 'deflate' }).toBuffer();
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    return { name: `${capture.serial}-${end}.tif`, kind, bytes, sha256 };
  }
}
