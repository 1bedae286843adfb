import { cpus } from 'node:os';
import sharp from 'sharp';
import { measure } from '../analysis/measure';
import { transform2d } from '../analysis/fft/transform2d';
import { simulateDark } from '../simulator/simulateDark';
import { simulatePinhole } from '../simulator/simulatePinhole';
import type { SimulatedSensor } from '../simulator/SimulatedSensor';
import { measureCaseSchema } from '../../shared/contracts/measureCase';
import { timingsSchema } from '../../shared/contracts/measureResult';

const stages = timingsSchema.keyof().options;
type Timings = Record<(typeof stages)[number], number>;

/** Sensor sizes that are measured, smallest first. */
const sizes = [
  { label: '0.3 Mpx', widthPx: 640, heightPx: 480 },
  { label: '1.3 Mpx', widthPx: 1280, heightPx: 1024 },
  { label: '5.0 Mpx', widthPx: 2592, heightPx: 1944 },
];
const rounds = 7;
const referenceSize = 1024;

/**
 * Times of the engine on simulated frames. Milliseconds depend on the machine, so each is also given as a ratio to two
 * references that are timed in the same run: one pass over the frame, and one Fourier transform of 1024 × 1024.
 */
async function main(): Promise<void> {
  console.log(
    `Engine benchmark, ${cpus().length} cores, ${cpus()[0]?.model ?? 'unknown processor'}, Node.js ${process.versions.node}`,
  );
  console.log(
    `Medians of ${rounds} rounds after one to warm up. pass = reading each pixel once; FFT = ${referenceSize} × ${referenceSize} complex.\n`,
  );
  const fftMs = median(repeat(3, timeFft));
  console.log(`FFT: ${fftMs.toFixed(1)} ms\n`);
  console.log(row(['frame', 'stage', 'ms', '× pass', '× FFT']));
  for (const size of sizes) await benchSize(size, fftMs);
}

async function benchSize({ label, widthPx, heightPx }: (typeof sizes)[number], fftMs: number): Promise<void> {
  const { files, plane } = await simulatedCapture(widthPx, heightPx);
  const passMs = median(repeat(15, () => timePass(plane)));
  const timings: Timings[] = [];
  const wallMs: number[] = [];
  for (let round = 0; round <= rounds; round++) {
    const started = performance.now();
    const { result } = await measure(simulatedCase(label), files);
    const elapsed = performance.now() - started;
    if (result.status !== 'measured') throw new Error(`The simulated frame was not measured: ${result.message}`);
    if (round === 0) continue;
    timings.push(result.timingsMs);
    wallMs.push(elapsed);
  }
  for (const stage of stages) {
    const ms = median(timings.map((each) => each[stage]));
    console.log(row([label, stage, ms.toFixed(1), (ms / passMs).toFixed(0), (ms / fftMs).toFixed(2)]));
  }
  const perSecond = 1000 / median(wallMs);
  const megapixels = (perSecond * widthPx * heightPx) / 1e6;
  console.log(
    row([label, 'throughput', `${perSecond.toFixed(1)} frames/s, ${megapixels.toFixed(1)} Mpx/s on one core`]),
  );
  console.log('');
}

const wavelengthNm = 632.8;
const distanceMm = 400;
const pixelPitchUm = 5.2;

function simulatedCase(id: string) {
  return measureCaseSchema.parse({
    id,
    frame: 'light.png',
    darks: ['dark-1.png', 'dark-2.png'],
    pattern: 'pinhole',
    wavelengthNm,
    distanceMm,
    pixelPitchUm,
    camera: { bitDepth: 12, electronsPerCount: 4, readNoiseElectrons: 10, blackCount: 64, whiteCount: 4095 },
  });
}

/** A light with six dark rings on the shorter side and two darks, as PNG files. */
async function simulatedCapture(widthPx: number, heightPx: number) {
  const sensor: SimulatedSensor = {
    ...{ widthPx, heightPx, pixelPitchUm, bitDepth: 12, seed: 11 },
    ...{ electronsPerCount: 4, readNoiseElectrons: 10, blackCount: 64 },
  };
  const halfSideMm = (heightPx / 2) * pixelPitchUm * 1e-3;
  const sixthDarkRing = 6.2439;
  const diameterUm = (sixthDarkRing * wavelengthNm * 1e-3 * distanceMm) / halfSideMm;
  const centrePx = { x: 0.51 * widthPx, y: 0.48 * heightPx };
  const { light } = simulatePinhole({
    ...{ sensor, diameterUm, wavelengthNm, distanceMm, centrePx, peakElectrons: 14_000, seed: 12 },
  });
  const darks = [13, 14].map((seed) => simulateDark({ sensor, seed }));
  const png = (plane: Uint16Array): Promise<Buffer> =>
    sharp(plane, { raw: { width: widthPx, height: heightPx, channels: 1 } })
      .toColourspace('grey16')
      .png({ compressionLevel: 1 })
      .toBuffer();
  const [frame, ...darkFiles] = await Promise.all([light, ...darks].map(png));
  return { files: { frames: [frame], darks: darkFiles, flats: [] }, plane: light };
}

let sink = 0;

function timePass(plane: Uint16Array): number {
  const started = performance.now();
  let sum = 0;
  for (let index = 0; index < plane.length; index++) sum += plane[index];
  sink += sum;
  return performance.now() - started;
}

function timeFft(): number {
  const data = Float64Array.from({ length: 2 * referenceSize * referenceSize }, (_, index) => index % 97);
  const started = performance.now();
  transform2d(data, referenceSize, false);
  sink += data[0];
  return performance.now() - started;
}

function repeat(count: number, once: () => number): number[] {
  return Array.from({ length: count }, once);
}

function median(values: number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)];
}

function row(cells: string[]): string {
  const widths = [9, 12, 10, 10, 10];
  return cells
    .map((cell, index) => (index < 2 ? cell.padEnd(widths[index]) : cell.padStart(widths[index] ?? 0)))
    .join('');
}

main().then(
  // The sums are used, so that no optimiser leaves the timed work out.
  () => Number.isFinite(sink) || process.exit(1),
  (error: unknown) => {
    console.error(error);
    process.exit(1);
  },
);
