import { simulatedRandom } from './simulatedRandom';

/** One invented camera: its size, its response and the faults that are its own. */
export interface SimulatedSensor {
  widthPx: number;
  heightPx: number;
  pixelPitchUm: number;
  /** Significant bits, 8 to 16; counts are stored at the low end. */
  bitDepth: number;
  electronsPerCount: number;
  readNoiseElectrons: number;
  /** Counts without any electron. */
  blackCount: number;
  /** Largest count; 2^bitDepth − 1 when left out. */
  whiteCount?: number;
  /** Mean dark signal of an exposure; 0 when left out. */
  darkElectrons?: number;
  /** Standard deviation of the dark signal from pixel to pixel. */
  darkUnevennessElectrons?: number;
  /** Part of the pixels that are hot, 0 to 1. */
  hotFraction?: number;
  /** Mean extra signal of a hot pixel (exponential distribution). */
  hotElectrons?: number;
  /** Standard deviation of the response from pixel to pixel, 0.005 for half a percent. */
  responseUnevenness?: number;
  /** Standard deviation of the response over the whole sensor. */
  responseDrift?: number;
  /** Thickness and refractive index of the glass before the sensitive plane. */
  coverGlassMm?: number;
  coverGlassIndex?: number;
  /** What tells one camera of this kind from another: the same seed gives the same faults in every frame. */
  seed: number;
}

export interface SensorFaults {
  /** Response of each pixel, mean 1; row-major. */
  response: Float32Array;
  /** Dark signal of each pixel, electrons; row-major. */
  darkElectrons: Float32Array;
}

const known = new WeakMap<SimulatedSensor, SensorFaults>();

/** Response and dark signal of every pixel; computed once for each sensor object. */
export function sensorFaults(sensor: SimulatedSensor): SensorFaults {
  const kept = known.get(sensor);
  if (kept !== undefined) return kept;
  const {
    widthPx,
    heightPx,
    darkElectrons = 0,
    darkUnevennessElectrons = 0,
    hotFraction = 0,
    hotElectrons = 0,
  } = sensor;
  const { responseUnevenness = 0, responseDrift = 0 } = sensor;
  const random = simulatedRandom(sensor.seed);
  const waves = [1, 2, 3].flatMap((order) =>
    [0, 1].map((turn) => ({
      x: (order * Math.PI * (turn === 0 ? 1 : -0.6)) / widthPx,
      y: (order * Math.PI * (turn === 0 ? 0.7 : 1)) / heightPx,
      phase: 2 * Math.PI * random.uniform(),
    })),
  );
  const height = responseDrift * Math.sqrt(2 / waves.length);
  const response = new Float32Array(widthPx * heightPx);
  const dark = new Float32Array(widthPx * heightPx);
  for (let row = 0, at = 0; row < heightPx; row++)
    for (let column = 0; column < widthPx; column++, at++) {
      let value = 1;
      if (responseUnevenness > 0) value += responseUnevenness * random.normal();
      if (height > 0) for (const wave of waves) value += height * Math.cos(wave.x * column + wave.y * row + wave.phase);
      response[at] = Math.max(0, value);
      let signal = darkElectrons;
      if (darkUnevennessElectrons > 0) signal += darkUnevennessElectrons * random.normal();
      if (hotFraction > 0 && random.uniform() < hotFraction) signal -= hotElectrons * Math.log(random.uniform());
      dark[at] = Math.max(0, signal);
    }
  const faults = { response, darkElectrons: dark };
  known.set(sensor, faults);
  return faults;
}

export interface Exposed {
  /** Row-major, one value a pixel. */
  counts: Uint16Array;
  clippedPixels: number;
  peakCounts: number;
}

/**
 * Reads a sensor out: light and dark signal with shot noise, read noise, gain, black level, rounding and clipping.
 *
 * @param lightElectrons expected electrons of a pixel of response 1, row-major; null for a dark frame
 */
export function expose(sensor: SimulatedSensor, lightElectrons: Float32Array | null, seed: number): Exposed {
  const { electronsPerCount, readNoiseElectrons, blackCount, bitDepth } = sensor;
  const whiteCount = sensor.whiteCount ?? 2 ** bitDepth - 1;
  const { response, darkElectrons } = sensorFaults(sensor);
  const random = simulatedRandom(Math.imul(seed, 0x9e3779b1) ^ 0x1f83d9ab);
  const counts = new Uint16Array(response.length);
  let clippedPixels = 0;
  let peakCounts = 0;
  for (let at = 0; at < counts.length; at++) {
    const expected = darkElectrons[at] + (lightElectrons === null ? 0 : lightElectrons[at] * response[at]);
    const electrons = random.poisson(expected) + readNoiseElectrons * random.normal();
    let value = Math.round(blackCount + electrons / electronsPerCount);
    if (value >= whiteCount) {
      value = whiteCount;
      clippedPixels++;
    } else if (value < 0) value = 0;
    if (value > peakCounts) peakCounts = value;
    counts[at] = value;
  }
  return { counts, clippedPixels, peakCounts };
}
