import { circularPattern } from '../../../shared/optics/circularPattern';
import { radiusOfReduced } from '../../../shared/optics/geometry';
import { diffractionTable, interpolateEven } from '../../../server/simulator/diffractionTable';
import { simulateDark } from '../../../server/simulator/simulateDark';
import { simulatePinhole } from '../../../server/simulator/simulatePinhole';
import type { SimulatedPinhole } from '../../../server/simulator/simulatePinhole';
import type { SimulatedSensor } from '../../../server/simulator/SimulatedSensor';
import { simulatedRandom } from '../../../server/simulator/simulatedRandom';

const sensor: SimulatedSensor = {
  widthPx: 200,
  heightPx: 160,
  pixelPitchUm: 5,
  bitDepth: 12,
  electronsPerCount: 4,
  readNoiseElectrons: 8,
  blackCount: 64,
  seed: 3,
};
const bench: SimulatedPinhole = {
  sensor,
  diameterUm: 300,
  wavelengthNm: 632.8,
  distanceMm: 100,
  centrePx: { x: 101.3, y: 77.8 },
  peakElectrons: 12_000,
  seed: 1,
};
/** Without noise: one count an electron, so that the counts are the light itself. */
const quiet: SimulatedSensor = { ...sensor, bitDepth: 16, electronsPerCount: 1, readNoiseElectrons: 0, blackCount: 0 };

const mean = (values: ArrayLike<number>) =>
  Array.prototype.reduce.call<ArrayLike<number>, [(sum: number, value: number) => number, number], number>(
    values,
    (sum, value) => sum + value,
    0,
  ) / values.length;

const same = (one: Uint16Array, other: Uint16Array) =>
  Buffer.compare(Buffer.from(one.buffer), Buffer.from(other.buffer)) === 0;

describe('the two ways to the same light', () => {
  // The simulator integrates the diffraction integral by quadrature with a Bessel function of its own; the models of
  // measuring use Lommel's series. They share no code.
  test.each([
    [0, 0],
    [0.2, 0],
    [2 * Math.PI * 0.5, 0.04],
    [2 * Math.PI * 2, 0],
    [2 * Math.PI * 2, 0.25],
  ])('u = %d, taper = %d', (u, taper) => {
    const { intensity, step } = diffractionTable(u, taper, 80);
    const peak = Math.max(...intensity);
    for (let v = 0; v < 80; v += 0.371)
      expect(Math.abs(interpolateEven(intensity, v / step) - circularPattern(u, taper, v).intensity)).toBeLessThan(
        4e-8 * peak,
      );
  });
});

describe('simulatedRandom', () => {
  test.each([0.3, 4, 11.9, 12.1, 60, 5000])('Poisson numbers of mean %d have that mean and variance', (expected) => {
    const random = simulatedRandom(8);
    const values = Array.from({ length: 40_000 }, () => random.poisson(expected));
    const average = mean(values);
    const variance = mean(values.map((value) => (value - average) ** 2));
    // Four standard errors.
    expect(Math.abs(average - expected)).toBeLessThan(4 * Math.sqrt(expected / 40_000));
    expect(Math.abs(variance / expected - 1)).toBeLessThan(4 * Math.sqrt((2 + 1 / expected) / 40_000));
    expect(values.every((value) => Number.isInteger(value) && value >= 0)).toBe(true);
  });

  test('normal numbers have mean 0 and variance 1', () => {
    const random = simulatedRandom(9);
    const values = Array.from({ length: 40_000 }, () => random.normal());
    expect(Math.abs(mean(values))).toBeLessThan(0.02);
    expect(Math.abs(mean(values.map((value) => value * value)) - 1)).toBeLessThan(0.03);
  });
});

describe('simulatePinhole', () => {
  test('the same seed gives the same frame, another seed the same pattern with other noise', () => {
    const first = simulatePinhole(bench);
    expect(same(simulatePinhole(bench).light, first.light)).toBe(true);
    const other = simulatePinhole({ ...bench, seed: 2 });
    expect(same(other.light, first.light)).toBe(false);
    expect(other.truth.peakCounts / first.truth.peakCounts).toBeCloseTo(1, 1);
  });

  test('the first dark ring stands where the exact angle puts it, about the stated centre', () => {
    const { light } = simulatePinhole({ ...bench, sensor: quiet, peakElectrons: 60_000 });
    const radiusPx = radiusOfReduced(3.831705970207512, 300, 632.8, 100) / 0.005;
    const at = (radius: number) => {
      let sum = 0;
      for (let angle = 0; angle < 360; angle += 1) {
        const x = bench.centrePx.x + radius * Math.cos((angle * Math.PI) / 180);
        const y = bench.centrePx.y + radius * Math.sin((angle * Math.PI) / 180);
        sum += light[Math.round(y) * quiet.widthPx + Math.round(x)];
      }
      return sum / 360;
    };
    const darkest = Array.from({ length: 81 }, (_, index) => radiusPx - 8 + index / 5).reduce((best, radius) =>
      at(radius) < at(best) ? radius : best,
    );
    expect(Math.abs(darkest - radiusPx)).toBeLessThan(1.2);
    // Point symmetry about the centre: the halves balance.
    expect(light[78 * quiet.widthPx + 101]).toBeGreaterThan(58_000);
  });

  test('light has the noise of electrons and reading, on the stated black level', () => {
    const even = {
      ...bench,
      sensor: { ...sensor, responseUnevenness: 0 },
      peakElectrons: 1e-6,
      backgroundElectrons: 900,
    };
    const { light } = simulatePinhole(even);
    const average = mean(light);
    const variance = mean(Array.from(light, (value) => (value - average) ** 2));
    expect(average).toBeCloseTo(64 + 225, 0);
    // (900 + 8²)/4² and the rounding 1/12.
    expect(Math.abs(variance / ((900 + 64) / 16 + 1 / 12) - 1)).toBeLessThan(0.04);
  });

  test('clips at the white level and counts what it clipped', () => {
    const { light, truth } = simulatePinhole({ ...bench, peakElectrons: 40_000 });
    expect(truth.peakCounts).toBe(4095);
    expect(truth.clippedPixels).toBe(light.filter((value) => value === 4095).length);
    expect(truth.clippedPixels).toBeGreaterThan(20);
    expect(simulatePinhole(bench).truth.clippedPixels).toBe(0);
  });

  test('a diverging source raises the Fresnel number, cover glass brings the pattern nearer, tilt stretches it to one side', () => {
    const plane = simulatePinhole(bench).truth;
    const diverging = simulatePinhole({ ...bench, illumination: { kind: 'diverging', sourceDistanceMm: 100 } }).truth;
    expect(diverging.fresnelNumber).toBeCloseTo(2 * plane.fresnelNumber, 12);
    const glazed = simulatePinhole({ ...bench, sensor: { ...sensor, coverGlassMm: 1.5, coverGlassIndex: 1.5 } }).truth;
    expect(glazed.millimetresPerV / plane.millimetresPerV).toBeCloseTo(0.995, 12);
    const { light } = simulatePinhole({
      ...bench,
      sensor: quiet,
      centrePx: { x: 100, y: 80 },
      tiltDeg: 20,
      peakElectrons: 60_000,
    });
    const side = (columns: number[]) => mean(columns.map((column) => light[80 * quiet.widthPx + column]));
    // On the far side the same place is nearer to the axis in angle, so it is brighter within the core.
    expect(side([125, 126, 127])).toBeGreaterThan(side([75, 74, 73]));
  });

  test('stray light may slope, and a second pattern stands at its offset', () => {
    const sloped = simulatePinhole({
      ...bench,
      peakElectrons: 1e-6,
      backgroundElectrons: 1000,
      backgroundSlopeElectrons: { x: 800, y: 0 },
    }).light;
    const columnMean = (column: number) => mean(Array.from({ length: 160 }, (_, row) => sloped[row * 200 + column]));
    expect(columnMean(195) - columnMean(4)).toBeCloseTo((800 * 191) / 200 / 4, -1);
    const ghost = simulatePinhole({ ...bench, ghost: { x: 60, y: -40, height: 0.1 } }).light;
    const alone = simulatePinhole(bench).light;
    const at = Math.round(77.8 - 40) * 200 + Math.round(101.3 + 60);
    expect((ghost[at] - alone[at]) / (0.1 * 3000)).toBeCloseTo(1, 0.5);
  });
});

describe('simulateDark', () => {
  const faulty: SimulatedSensor = {
    ...sensor,
    darkElectrons: 40,
    darkUnevennessElectrons: 5,
    hotFraction: 0.002,
    hotElectrons: 4000,
  };

  test('hot pixels stay where they are from frame to frame, noise does not', () => {
    const first = simulateDark({ sensor: faulty, seed: 1 });
    const second = simulateDark({ sensor: faulty, seed: 2 });
    const hot = (frame: Uint16Array) => new Set(Array.from(frame.keys()).filter((at) => frame[at] > 400));
    expect(hot(first).size).toBeGreaterThan(20);
    expect([...hot(first)].filter((at) => !hot(second).has(at)).length).toBeLessThanOrEqual(3);
    expect(same(first, second)).toBe(false);
    // The same camera made again is the same camera.
    expect(same(simulateDark({ sensor: { ...faulty }, seed: 1 }), first)).toBe(true);
  });

  test('the mean is black and dark signal', () => {
    const frame = simulateDark({ sensor: { ...faulty, hotFraction: 0 }, seed: 1 });
    expect(mean(frame)).toBeCloseTo(64 + 10, 0);
  });
});
