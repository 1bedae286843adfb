import { cieObserver } from './cieObserver';
import { encodeSrgb, fromHex, linearSrgbToOklab, luminance, oklchToLinearSrgb, toHex, xyzToLinearSrgb } from './oklab';
import type { Triple } from './oklab';

export type Theme = 'dark' | 'light';
export interface Accent {
  /** The mark itself. */
  accent: string;
  /** Bands of uncertainty. */
  soft: string;
  /** The faintest wash of the same hue. */
  faint: string;
}

interface Level {
  luminance: number;
  /** Largest linear sRGB channel. */
  channelCap: number;
  chromaCap: number;
}

const LEVELS: Record<Theme, Record<keyof Accent, Level>> = {
  dark: {
    accent: { luminance: 0.22, channelCap: 1, chromaCap: 1 },
    soft: { luminance: 0.045, channelCap: 0.3, chromaCap: 1 },
    faint: { luminance: 0.016, channelCap: 0.1, chromaCap: 1 },
  },
  light: {
    accent: { luminance: 0.13, channelCap: 1, chromaCap: 1 },
    soft: { luminance: 0.56, channelCap: 1, chromaCap: 0.1 },
    faint: { luminance: 0.76, channelCap: 1, chromaCap: 0.045 },
  },
};

/** No bench chosen: no hue. */
const NEUTRAL: Record<Theme, Accent> = {
  dark: { accent: '#A69C91', soft: '#3F3B38', faint: '#232220' },
  light: { accent: '#30312F', soft: '#BABCB9', faint: '#DBDDDA' },
};

const BISECTIONS = 40;

/** Colour of given OKLab chroma and hue whose lightness is solved so that its luminance is as asked. */
function atLuminance(target: number, chroma: number, hueRad: number): Triple {
  let low = 0;
  let high = 1.5;
  for (let step = 0; step < BISECTIONS; step += 1) {
    const middle = (low + high) / 2;
    if (luminance(oklchToLinearSrgb(middle, chroma, hueRad)) < target) low = middle;
    else high = middle;
  }
  return oklchToLinearSrgb((low + high) / 2, chroma, hueRad);
}

function withinGamut(colour: Triple, cap: number): boolean {
  return colour.every((channel) => channel >= 0 && channel <= cap);
}

/** Most colourful sRGB colour of the spectral hue at a fixed luminance. */
function spectralColour(wavelengthNm: number, level: Level): Triple {
  const [x, y, z] = cieObserver(wavelengthNm);
  const scale = level.luminance / y;
  const [, a, b] = linearSrgbToOklab(xyzToLinearSrgb([x * scale, y * scale, z * scale]));
  const hueRad = Math.atan2(b, a);
  let low = 0;
  let high = Math.min(level.chromaCap, Math.hypot(a, b));
  if (withinGamut(atLuminance(level.luminance, high, hueRad), level.channelCap))
    return atLuminance(level.luminance, high, hueRad);
  for (let step = 0; step < BISECTIONS; step += 1) {
    const middle = (low + high) / 2;
    if (withinGamut(atLuminance(level.luminance, middle, hueRad), level.channelCap)) low = middle;
    else high = middle;
  }
  return atLuminance(level.luminance, low, hueRad);
}

/**
 * The one accent of the face: the colour of the laser at a fixed luminance, so that every laser has the same contrast.
 *
 * The colour-matching functions of the wavelength are scaled to the theme's luminance; the OKLab hue is kept and the
 * chroma lowered at that luminance until the colour lies in sRGB. Without a wavelength the accent is neutral.
 *
 * @param wavelengthNm wavelength in air, nm; null when no bench is chosen
 */
export function accentForWavelength(wavelengthNm: number | null, theme: Theme): Accent {
  if (wavelengthNm === null) return NEUTRAL[theme];
  const levels = LEVELS[theme];
  return {
    accent: toHex(spectralColour(wavelengthNm, levels.accent)),
    soft: toHex(spectralColour(wavelengthNm, levels.soft)),
    faint: toHex(spectralColour(wavelengthNm, levels.faint)),
  };
}

const MAP_SIZE = 256;
/** OKLab lightness of tone 0 and tone 1. The dark map never reaches white; the light one is the negative, light as ink. */
const MAP_LIGHTNESS: Record<Theme, [number, number]> = { dark: [0.13, 0.7], light: [0.985, 0.27] };
/** Entries on each side over which the chroma is smoothed, so that no edge of the gamut shows as a false ring. */
const SMOOTHING = 14;

/** Largest OKLab chroma, up to a cap, that sRGB holds at a lightness and hue. */
function gamutChroma(lightness: number, hueRad: number, cap: number): number {
  let low = 0;
  let high = cap;
  for (let step = 0; step < BISECTIONS; step += 1) {
    const middle = (low + high) / 2;
    if (withinGamut(oklchToLinearSrgb(lightness, middle, hueRad), 1)) low = middle;
    else high = middle;
  }
  return low;
}

/**
 * Colour map of frames in the laser's own hue: 256 entries of sRGB bytes (red, green, blue, tone rising), OKLab lightness even in
 * the tone, chroma as large as sRGB allows, smoothed. Dark theme: lightness 0.13 to 0.70. Light theme: the negative.
 * Without a wavelength the map has the hue of the neutral accent and no more than its chroma.
 *
 * @param wavelengthNm wavelength in air, nm; null when none is known
 * @returns Uint8Array of length 768
 */
export function ownColourMap(wavelengthNm: number | null, theme: Theme): Uint8Array {
  const [, a, b] = linearSrgbToOklab(fromHex(accentForWavelength(wavelengthNm, theme).accent));
  const hueRad = Math.atan2(b, a);
  const cap = wavelengthNm === null ? Math.hypot(a, b) : 0.4;
  const [first, last] = MAP_LIGHTNESS[theme];
  const lightness = (index: number) => first + ((last - first) * index) / (MAP_SIZE - 1);
  const largest = Array.from({ length: MAP_SIZE }, (_, index) => gamutChroma(lightness(index), hueRad, cap));

  // The smallest value within the window, then a mean over the same window: smooth and never outside sRGB.
  const near = (values: number[], index: number) =>
    values.slice(Math.max(0, index - SMOOTHING), Math.min(MAP_SIZE, index + SMOOTHING + 1));
  const eroded = largest.map((_, index) => Math.min(...near(largest, index)));
  const bytes = new Uint8Array(MAP_SIZE * 3);
  for (let index = 0; index < MAP_SIZE; index += 1) {
    const window = near(eroded, index);
    const chroma = window.reduce((sum, value) => sum + value, 0) / window.length;
    oklchToLinearSrgb(lightness(index), chroma, hueRad).forEach((channel, at) => {
      bytes[index * 3 + at] = Math.round(255 * encodeSrgb(Math.min(1, Math.max(0, channel))));
    });
  }
  return bytes;
}
