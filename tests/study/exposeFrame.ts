import { lookUp, tabulatePattern, type RadialTable } from './diffraction';
import type { StudyCase } from './drawStudyCase';
import type { RandomSource } from './RandomSource';

/** Light on each pixel, electrons, and how it changes with what a fit would leave free. */
export interface ExpectedFrame {
  electrons: Float64Array;
  table: RadialTable;
  peakElectrons: number;
}

const { sqrt } = Math;

/** Places and weights of three points across a pixel (Gauss–Legendre). */
const ACROSS = [-sqrt(0.15), 0, sqrt(0.15)];
const SHARES = [5 / 18, 8 / 18, 5 / 18];
/** Of the pixels' response, relative standard deviation from pixel to pixel and over the sensor. */
export const WHITE_RESPONSE = 0.005;
export const SMOOTH_RESPONSE = 0.001;

/** Electrons that a perfect sensor would collect on average, each pixel averaged over its square. */
export function expectedFrame(study: StudyCase): ExpectedFrame {
  const { widthPx, heightPx, centre } = study;
  const pitchMm = study.pitchUm / 1000;
  const reachPx = Math.hypot(Math.max(centre.x, widthPx - centre.x), Math.max(centre.y, heightPx - centre.y)) + 1;
  const table = tabulatePattern(
    {
      radiusMm: study.sizeUm / 2000,
      wavelengthMm: study.wavelengthNm * 1e-6,
      distanceMm: study.distanceMm,
      taper: study.taper,
    },
    reachPx * pitchMm,
  );
  const perStep = pitchMm / table.stepMm;
  const electrons = new Float64Array(widthPx * heightPx);
  let peak = 0;
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      let sum = 0;
      for (let j = 0; j < 3; j++) {
        const dy = y + ACROSS[j] - centre.y;
        for (let i = 0; i < 3; i++) {
          const dx = x + ACROSS[i] - centre.x;
          sum += SHARES[i] * SHARES[j] * lookUp(table.intensity, sqrt(dx * dx + dy * dy) * perStep);
        }
      }
      electrons[y * widthPx + x] = sum;
      if (sum > peak) peak = sum;
    }
  }
  const scale = (study.exposure * study.fullElectrons) / peak;
  const { background, slopeX, slopeY, exposure, fullElectrons } = study;
  for (let i = 0; i < electrons.length; i++) {
    const across = (i % widthPx) / widthPx - 0.5;
    const down = Math.floor(i / widthPx) / heightPx - 0.5;
    const level = background + slopeX * across + slopeY * down;
    electrons[i] = electrons[i] * scale + level * exposure * fullElectrons;
  }
  return { electrons, table, peakElectrons: scale };
}

/** Response of each pixel about 1: white from pixel to pixel, and smooth over the sensor in eight long waves. */
export function drawResponse({ widthPx, heightPx }: StudyCase, random: RandomSource): Float64Array {
  const waves = Array.from({ length: 8 }, () => ({
    x: (2 * Math.PI * random.between(-2.5, 2.5)) / widthPx,
    y: (2 * Math.PI * random.between(-2.5, 2.5)) / heightPx,
    phase: random.between(0, 2 * Math.PI),
  }));
  return Float64Array.from({ length: widthPx * heightPx }, (_, i) => {
    const x = i % widthPx;
    const y = Math.floor(i / widthPx);
    const smooth = waves.reduce((sum, wave) => sum + Math.sin(wave.x * x + wave.y * y + wave.phase), 0);
    return 1 + WHITE_RESPONSE * random.normal() + (SMOOTH_RESPONSE * smooth) / 2;
  });
}

/** Counts of one exposure: shot noise, read noise, rounding, clipping at both ends. */
export function exposeFrame(
  study: StudyCase,
  electrons: Float64Array,
  response: Float64Array | null,
  random: RandomSource,
): Uint16Array {
  const white = 2 ** study.bitDepth - 1;
  const gain = electronsPerCount(study);
  return Uint16Array.from(electrons, (mean, i) => {
    const collected = random.poisson(mean * (response === null ? 1 : response[i]));
    const count = Math.round(study.blackCount + (collected + study.readNoiseElectrons * random.normal()) / gain);
    return Math.min(white, Math.max(0, count));
  });
}

export function electronsPerCount(study: StudyCase): number {
  return study.fullElectrons / (2 ** study.bitDepth - 1 - study.blackCount);
}

/** A binary graymap (netpbm's P5), big-endian above 255. */
export function graymapFile(counts: Uint16Array, { widthPx, heightPx, bitDepth }: StudyCase): Buffer {
  const bytes = bitDepth > 8 ? 2 : 1;
  const pixels = Buffer.alloc(counts.length * bytes);
  for (let i = 0; i < counts.length; i++) {
    if (bytes === 2) pixels.writeUInt16BE(counts[i], 2 * i);
    else pixels[i] = counts[i];
  }
  return Buffer.concat([Buffer.from(`P5\n${widthPx} ${heightPx}\n${2 ** bitDepth - 1}\n`), pixels]);
}
