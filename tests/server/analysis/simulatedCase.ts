import { measureCaseSchema, type MeasureCase, type MeasureCaseInput } from '../../../shared/contracts/measureCase';
import { measure, type MeasureOutput } from '../../../server/analysis/measure';
import { simulatePinhole, type SimulatedPinhole } from '../../../server/simulator/simulatePinhole';

/** A binary graymap of 16 bits, as the engine reads it. */
export function graymap(counts: Uint16Array, widthPx: number, heightPx: number, whiteCount = 65_535): Buffer {
  const header = Buffer.from(`P5\n${widthPx} ${heightPx}\n${whiteCount}\n`);
  const wide = whiteCount > 255;
  const pixels = Buffer.alloc(counts.length * (wide ? 2 : 1));
  counts.forEach((value, i) => (wide ? pixels.writeUInt16BE(value, 2 * i) : (pixels[i] = value)));
  return Buffer.concat([header, pixels]);
}

export const SENSOR = {
  widthPx: 360,
  heightPx: 300,
  pixelPitchUm: 5.2,
  bitDepth: 12,
  electronsPerCount: 4,
  readNoiseElectrons: 8,
  blackCount: 64,
  seed: 11,
} as const;

export const BENCH: SimulatedPinhole = {
  sensor: SENSOR,
  diameterUm: 200,
  wavelengthNm: 632.8,
  distanceMm: 100,
  centrePx: { x: 171.3, y: 152.8 },
  peakElectrons: 12_000,
  seed: 5,
};

/** Simulates a frame and measures it with what the bench would be known to be. */
export async function measureSimulated(
  change: Partial<SimulatedPinhole>,
  more: Partial<MeasureCaseInput> = {},
  extra: { darks?: Buffer[]; flats?: Buffer[] } = {},
): Promise<MeasureOutput & { measureCase: MeasureCase }> {
  const options = { ...BENCH, ...change };
  const { light } = simulatePinhole(options);
  const { widthPx, heightPx, bitDepth, pixelPitchUm } = options.sensor;
  const measureCase = measureCaseSchema.parse({
    id: 'simulated',
    frame: 'simulated.pgm',
    pattern: 'pinhole',
    wavelengthNm: options.wavelengthNm,
    distanceMm: options.distanceMm,
    pixelPitchUm,
    camera: { bitDepth },
    ...more,
  });
  const output = await measure(measureCase, {
    frames: [graymap(light, widthPx, heightPx, 2 ** bitDepth - 1)],
    darks: extra.darks ?? [],
    flats: extra.flats ?? [],
  });
  return { ...output, measureCase };
}

export function measuredOf(output: MeasureOutput) {
  if (output.result.status !== 'measured') throw new Error(JSON.stringify(output.result));
  const { sizeUm, standardUncertaintyUm, fitUncertaintyUm, centrePx } = output.result;
  if (sizeUm === null || standardUncertaintyUm === null || fitUncertaintyUm === null || centrePx === null)
    throw new Error('A pinhole has a size.');
  return { ...output.result, sizeUm, standardUncertaintyUm, fitUncertaintyUm, centrePx };
}
