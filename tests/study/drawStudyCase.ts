import type { RandomSource } from './RandomSource';

/** What a simulated frame is made from; the truth. */
export interface StudyCase {
  sizeUm: number;
  wavelengthNm: number;
  distanceMm: number;
  pitchUm: number;
  /** (a / w)², 0 for even light. */
  taper: number;
  fresnelNumber: number;
  widthPx: number;
  heightPx: number;
  centre: { x: number; y: number };
  bitDepth: number;
  /** Electrons that fill the range above black. */
  fullElectrons: number;
  readNoiseElectrons: number;
  blackCount: number;
  /** Peak of the pattern over the range above black; over 1 the core is clipped. */
  exposure: number;
  /** Even background and its change from side to side, of the peak. */
  background: number;
  slopeX: number;
  slopeY: number;
  /** Gain, read noise and black level are on record. */
  onRecord: boolean;
}

/** Draws a frame whose rings are wide enough for its pixels and whose numbers a bench could have. */
export function drawStudyCase(random: RandomSource): StudyCase {
  for (;;) {
    const pitchUm = random.betweenLog(3, 15);
    const fringePx = random.between(6, 22);
    const sizeUm = random.betweenLog(25, 500);
    const wavelengthNm = random.between(405, 850);
    const widthPx = Math.round(random.between(160, 260));
    const heightPx = Math.round(random.between(160, 260));
    const fresnelNumber = sizeUm / (4 * fringePx * pitchUm);
    const distanceMm = (sizeUm * fringePx * pitchUm) / wavelengthNm;
    const cornerMm = (0.6 * Math.hypot(widthPx, heightPx) * pitchUm) / 1000;
    if (fresnelNumber > 2 || cornerMm > 0.12 * distanceMm) continue;
    const bitDepth = [8, 10, 12, 14, 16][Math.floor(5 * random.next())];
    const away = random.chance(0.2) ? 0.3 : 0.08;
    return {
      sizeUm,
      wavelengthNm,
      distanceMm,
      pitchUm,
      fresnelNumber,
      taper: random.chance(0.5) ? 0 : random.between(0.02, 0.3),
      widthPx,
      heightPx,
      centre: {
        x: widthPx * (0.5 + random.between(-away, away)),
        y: heightPx * (0.5 + random.between(-away, away)),
      },
      bitDepth,
      fullElectrons: random.betweenLog(10_000, 60_000),
      readNoiseElectrons: random.betweenLog(2, 20),
      blackCount: Math.round(random.between(0.01, 0.04) * 2 ** bitDepth),
      exposure: random.chance(0.15) ? random.between(1.1, 3) : random.between(0.4, 0.9),
      // Never below zero at a corner, so that it is a plane.
      background: random.between(0.003, 0.02),
      slopeX: random.between(-0.003, 0.003),
      slopeY: random.between(-0.003, 0.003),
      onRecord: random.chance(0.5),
    };
  }
}
