import besselj0 from '@stdlib/math-base-special-besselj0';
import { leastSquares } from '../../../shared/metrology/leastSquares';
import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import { transform2d } from '../fft/transform2d';
import { fresnelU, reducedRadius, type PinholeOptics } from '../fit/PinholeOptics';
import { COLUMNS, intensityAt, LARGEST_V, pinholeTable } from '../models/pinholeTable';

export interface SecondOpinion {
  sizeUm: number | null;
  standardUncertaintyUm: number | null;
  reason: string | null;
}

const SIZE = 256;
/** Spatial frequencies used, parts of the cut-off D/λz. */
const LOWEST = 0.12;
const HIGHEST = 0.92;
const RADII = 500;
/** Blocks to the length λz/D: the blocks' own blur is then small and known. */
const BLOCKS_PER_FRINGE = 6;
/** Part of the window's radius over which it falls to nothing. */
const TAPER = 0.5;
/** Least modulus over the noise's of a frequency that is used. */
const CLEAR = 4;
/** Uneven response of the sensor in the spectrum, part of its largest value. Computed on simulated frames. */
const UNEVEN = 2e-4;
/** What the window and the reduction to blocks leave, relative. Computed on simulated frames. */
const METHOD = 3e-4;

/**
 * Size from the Fourier transform of the frame: its modulus is the autocorrelation of the aperture (Goodman,
 * Introduction to Fourier Optics, from memory), for a round hole (2/π)(arccos s − s√(1 − s²)) up to the cut-off D/λz,
 * smeared by the window through which the frame shows the pattern. Neither a centre (a shift changes the phase only) nor
 * a ring nor a background enters: only the modulus against frequency, amplitude and window offset free. The start is the
 * cut-off seen in the spectrum itself.
 * @param reason why it cannot be had, found out by the caller; null when it can
 */
export function secondOpinion(
  frame: CalibratedFrame,
  optics: PinholeOptics,
  illumination: number,
  firstSizeMm: number,
  reason: string | null,
): SecondOpinion {
  const none = (why: string): SecondOpinion => ({ sizeUm: null, standardUncertaintyUm: null, reason: why });
  if (reason !== null) return none(reason);
  const { x, y } = brightCentre(frame);
  const reach = Math.min(x, y, frame.widthPx - 1 - x, frame.heightPx - 1 - y);
  const fringe = (2 * Math.PI * optics.distanceMm) / (optics.waveNumber * firstSizeMm * optics.pitchMm);
  if (reach < 1.25 * fringe) return none('The frame does not show enough of the pattern on all sides.');
  const window = Math.min(reach, 12 * fringe);
  const block = Math.max(1, Math.floor(fringe / BLOCKS_PER_FRINGE), Math.ceil((2 * window) / SIZE));
  if (fringe / block < 3) return none('The rings are too narrow for a transform of this size.');
  const cutOff = (SIZE * block) / fringe;
  const spectrum = windowedSpectrum(frame, x, y, window, block, cutOff);
  const bins: number[] = [];
  for (let bin = Math.ceil(LOWEST * cutOff); bin <= Math.min(SIZE / 2 - 2, HIGHEST * cutOff); bin++)
    if (spectrum.modulus[bin] > CLEAR * spectrum.noise) bins.push(bin);
  if (bins.length < 5) return none('The frame does not show enough of the pattern for its transform.');
  const windowBlocks = window / block;
  // Hankel transform of model × window on the radii of the window; frequencies in cycles a block.
  const radii = Float64Array.from({ length: RADII }, (_, i) => ((i + 0.5) / RADII) * windowBlocks);
  const weights = radii.map((r) => ((2 * Math.PI * windowBlocks) / RADII) * r * taper(r / windowBlocks));
  const kernel = bins.map((bin) =>
    radii.map((r, i) => weights[i] * besselj0(2 * Math.PI * spectrum.frequency[bin] * r)),
  );
  const offset = kernel.map((row) => row.reduce((s, k) => s + k, 0));
  const modelled = (sizeMm: number) => {
    const radius = sizeMm / 2;
    const scale = (radius / (firstSizeMm / 2)) ** 2;
    const pixelV = (optics.waveNumber * radius * optics.pitchMm * block) / optics.distanceMm;
    const largest = Math.min(LARGEST_V, reducedRadius(optics, radius, window * optics.pitchMm) + 0.5);
    const table = pinholeTable({ u: fresnelU(optics, radius), illumination: illumination * scale, pixelV }, largest);
    const end = ((table.length / COLUMNS - 1) * 0.05) as number;
    const intensity = radii.map((r) =>
      intensityAt(table, Math.min(end, reducedRadius(optics, radius, r * block * optics.pitchMm))),
    );
    return kernel.map((row) => row.reduce((s, k, i) => s + k * intensity[i], 0));
  };
  const y0 = bins.map((bin) => spectrum.modulus[bin]);
  // Neighbouring bins and directions are not independent: the window blurs the spectrum over several.
  const alike = Math.max(1, (SIZE * block) / (2 * window));
  const deviation = bins.map((bin) =>
    Math.hypot(spectrum.noise / Math.sqrt(2 * Math.max(1, spectrum.numbers[bin] / alike)), UNEVEN * Math.max(...y0)),
  );
  const first = modelled(firstSizeMm);
  const amplitude = y0.reduce((s, v, i) => s + v * Math.abs(first[i]), 0) / first.reduce((s, v) => s + v * v, 0);
  const fit = leastSquares(
    {
      parameters: [
        {
          name: 'logSize',
          unit: '1',
          initialValue: Math.log(firstSizeMm),
          minValue: Math.log(firstSizeMm) - 0.3,
          maxValue: Math.log(firstSizeMm) + 0.3,
        },
        { name: 'amplitude', unit: 'count', initialValue: amplitude },
        { name: 'offset', unit: 'count', initialValue: 0 },
      ],
      y: y0,
      yUncertainty: deviation,
      evaluate: (values, model, jacobian) => {
        const now = modelled(Math.exp(values[0]));
        const step = 1e-3;
        const up = jacobian === null ? now : modelled(Math.exp(values[0] + step));
        const down = jacobian === null ? now : modelled(Math.exp(values[0] - step));
        for (let i = 0; i < bins.length; i++) {
          const signed = values[1] * now[i] + values[2] * offset[i];
          const sign = signed < 0 ? -1 : 1;
          model[i] = sign * signed;
          if (jacobian === null) continue;
          jacobian[3 * i] = (sign * values[1] * (up[i] - down[i])) / (2 * step);
          jacobian[3 * i + 1] = sign * now[i];
          jacobian[3 * i + 2] = sign * offset[i];
        }
      },
    },
    { maxIterations: 30 },
  );
  const [size] = fit.parameters;
  if (fit.status === 'non-finite' || size.stdUncertainty === null || size.atBound)
    return none('The transform of the frame does not follow that of a round hole.');
  const sizeUm = Math.exp(size.value) * 1000;
  const widen = Math.sqrt(alike * Math.max(1, fit.reducedChiSquare ?? 1));
  return {
    sizeUm,
    standardUncertaintyUm: sizeUm * Math.hypot(size.stdUncertainty * widen, METHOD),
    reason: null,
  };
}

function taper(part: number): number {
  if (part >= 1) return 0;
  return part <= 1 - TAPER ? 1 : 0.5 * (1 + Math.cos((Math.PI * (part - 1 + TAPER)) / TAPER));
}

/** Mean place of the light above half of its range: only where to look, not a centre that is measured from. */
function brightCentre({ counts, mask, widthPx, heightPx }: CalibratedFrame): { x: number; y: number } {
  const some: number[] = [];
  const skip = Math.max(1, Math.floor(counts.length / 100_000));
  for (let i = 0; i < counts.length; i += skip) if (mask[i] === 0) some.push(counts[i]);
  some.sort((a, b) => a - b);
  const half = (some[some.length >> 1] + some[Math.floor(some.length * 0.999)]) / 2;
  let n = 0;
  let sx = 0;
  let sy = 0;
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      const i = y * widthPx + x;
      if (mask[i] !== 0 || counts[i] < half) continue;
      n++;
      sx += x;
      sy += y;
    }
  }
  return { x: sx / n, y: sy / n };
}

/** Modulus of the transform of the windowed frame, averaged over directions, with the mean frequency of each bin. */
function windowedSpectrum(
  { counts, mask, widthPx, heightPx }: CalibratedFrame,
  cx: number,
  cy: number,
  window: number,
  block: number,
  cutOff: number,
) {
  const data = new Float64Array(2 * SIZE * SIZE);
  const filled = new Float64Array(SIZE * SIZE);
  const left = Math.round(cx - (SIZE * block) / 2);
  const top = Math.round(cy - (SIZE * block) / 2);
  for (let y = Math.max(0, top); y < Math.min(heightPx, top + SIZE * block); y++) {
    const row = Math.floor((y - top) / block) * SIZE;
    for (let x = Math.max(0, left); x < Math.min(widthPx, left + SIZE * block); x++) {
      const i = y * widthPx + x;
      if (mask[i] !== 0) continue;
      const at = row + Math.floor((x - left) / block);
      data[2 * at] += counts[i];
      filled[at]++;
    }
  }
  for (let y = 0; y < SIZE; y++) {
    for (let x = 0; x < SIZE; x++) {
      const at = y * SIZE + x;
      const px = left + x * block + (block - 1) / 2;
      const py = top + y * block + (block - 1) / 2;
      data[2 * at] = filled[at] > 0 ? (data[2 * at] / filled[at]) * taper(Math.hypot(px - cx, py - cy) / window) : 0;
    }
  }
  transform2d(data, SIZE, false);
  const modulus = new Float64Array(SIZE);
  const frequency = new Float64Array(SIZE);
  const n = new Float64Array(SIZE);
  for (let y = 0; y < SIZE; y++) {
    const fy = y < SIZE / 2 ? y : y - SIZE;
    for (let x = 0; x < SIZE; x++) {
      const fx = x < SIZE / 2 ? x : x - SIZE;
      const f = Math.hypot(fx, fy);
      const bin = Math.round(f);
      if (bin >= SIZE / 2) continue;
      const at = 2 * (y * SIZE + x);
      modulus[bin] += data[at] * data[at] + data[at + 1] * data[at + 1];
      frequency[bin] += f;
      n[bin]++;
    }
  }
  for (let b = 0; b < SIZE / 2; b++) {
    modulus[b] /= Math.max(1, n[b]);
    frequency[b] /= Math.max(1, n[b]) * SIZE;
  }
  // Beyond the cut-off there is noise alone; its power lies beneath the pattern's as well.
  const beyond = modulus.slice(Math.min(SIZE / 2 - 8, Math.ceil(1.25 * cutOff)), SIZE / 2);
  const floor = beyond.reduce((s, power) => s + power, 0) / beyond.length;
  for (let b = 0; b < SIZE / 2; b++) modulus[b] = Math.sqrt(Math.max(0, modulus[b] - floor));
  return { modulus, frequency, noise: Math.sqrt(floor), numbers: n };
}
