import { airyIntensity, airyDerivative, AIRY_DARK_V } from '../../../shared/optics/airy';
import { besselJ } from '../../../shared/optics/besselJ';
import { circularPattern, tabulateCircularPattern } from '../../../shared/optics/circularPattern';
import { NEAR_FIELD_FRESNEL_NUMBER } from '../../../shared/optics/fresnelNumber';
import { fresnelCircleIrradiance, lommelFunctions } from '../../../shared/optics/lommel';
import { findMinimum } from './findExtremum';

const V = [0, 1, 2, 3, 3.8317059702, 5, 7.0155866698, 10];
/** I/I_inc by direct integration to 25 digits (computed); the series agrees at v = 5. */
const TABLE: [number, number[]][] = [
  [
    0.01,
    [
      9.868792685e-4, 7.644153426e-4, 3.282507873e-4, 5.043266531e-5, 1.17279246e-8, 1.695142879e-5, 5.795462451e-10,
      7.470260414e-8,
    ],
  ],
  [
    0.1,
    [
      0.09788696741, 0.07582409869, 0.03259206858, 0.005093825733, 1.16719866e-4, 0.001754394016, 5.857320632e-6,
      8.398195213e-6,
    ],
  ],
  [
    0.25,
    [
      0.5857864376, 0.4538516547, 0.1961246526, 0.03344985083, 0.004444995373, 0.01286966322, 2.412914112e-4,
      8.445684772e-5,
    ],
  ],
  [0.5, [2.0, 1.55082928, 0.6840207572, 0.1536116155, 0.06490432671, 0.07560363818, 0.004505988154, 8.639921112e-4]],
  [1, [4.0, 3.116853237, 1.538084768, 0.7697477669, 0.7117192238, 0.5314750109, 0.09886703289, 0.01657576146]],
  [2, [0, 0.05512486055, 0.6010984977, 1.572840055, 1.935601672, 1.497914004, 1.380370097, 0.4780207156]],
  [3, [4.0, 3.116026276, 1.502392534, 0.572734261, 0.3977043862, 0.6437052243, 1.319914429, 1.701519836]],
  [4, [0, 0.05513030986, 0.6020335704, 1.583996915, 1.959652556, 1.415787344, 0.7363645139, 0.8279681552]],
];
const entries = TABLE.flatMap(([n, row]) => row.map((value, index) => ({ n, v: V[index], value })));

describe('circle at a finite Fresnel number (Born & Wolf 8.8.1, from memory; Mielenz 1998, looked up)', () => {
  test.each(entries)('N = $n, v = $v: $value', ({ n, v, value }) => {
    // Ten printed digits; v at the zeros is rounded to eleven, and near them the light goes with its square.
    const tolerance = 6e-10 * Math.max(value, 1e-3) + 1e-16;
    expect(Math.abs(fresnelCircleIrradiance(2 * Math.PI * n, v) - value)).toBeLessThan(tolerance);
    expect(Math.abs(circularPattern(2 * Math.PI * n, 0, v).intensity * (Math.PI * n) ** 2 - value)).toBeLessThan(
      tolerance,
    );
  });

  // I at the shadow edge u = v: ¼[1 − 2 J0(u) cos u + J0(u)²] (computed, both formulas agree).
  test.each([
    [1, 0.189662837632],
    [2, 0.309117489982],
    [5, 0.283073897436],
    [10, 0.161942251093],
    [20, 0.222894424926],
  ])('shadow edge u = v = %d', (u, value) => {
    expect(fresnelCircleIrradiance(u, u)).toBeCloseTo(value, 11);
    expect(0.25 * (1 - 2 * besselJ(0, u) * Math.cos(u) + besselJ(0, u) ** 2)).toBeCloseTo(value, 11);
  });

  // On the axis 4 sin²(πN/2) (computed).
  test.each([
    [0.1, 0.09788697],
    [0.25, 0.58578644],
    [0.5, 2],
    [1, 4],
    [1.5, 2],
    [2, 0],
  ])('axis at N = %d', (n, value) => expect(fresnelCircleIrradiance(2 * Math.PI * n, 0)).toBeCloseTo(value, 8));

  test('the two pairs of functions meet where the series change over', () => {
    for (const u of [0.5, 3, 12]) {
      const below = lommelFunctions(u, u * (1 - 1e-13));
      const above = lommelFunctions(u, u * (1 + 1e-13));
      (['u1', 'u2', 'v0', 'v1'] as const).forEach((name) => expect(below[name]).toBeCloseTo(above[name], 11));
    }
    expect(() => lommelFunctions(0, 1)).toThrow(RangeError);
  });

  test('dark rings stay at the zeros of J1 until they turn bright at N = 0.9129, 1.5359 and 2.1283 (computed)', () => {
    [0.9129, 1.5359, 2.1283].forEach((turn, index) => {
      const dark = AIRY_DARK_V[index];
      const bend = (n: number) => {
        const at = (v: number) => circularPattern(2 * Math.PI * n, 0, v).byV;
        return (at(dark + 1e-4) - at(dark - 1e-4)) / 2e-4;
      };
      for (const n of [0.01, 0.5 * turn, turn - 0.0003]) {
        expect(Math.abs(circularPattern(2 * Math.PI * n, 0, dark).byV)).toBeLessThan(1e-12);
        expect(bend(n)).toBeGreaterThan(0);
      }
      expect(bend(turn + 0.0003)).toBeLessThan(0);
    });
  });

  // Depth of the first minimum over the axis (computed).
  test.each([
    [0.01, 1.19e-5],
    [0.05, 2.97e-4],
    [0.1, 1.19e-3],
    [0.2, 4.82e-3],
    [0.3, 1.1e-2],
    [0.5, 3.25e-2],
  ])('first minimum at N = %d is %d of the axis', (n, depth) => {
    const at = (v: number) => circularPattern(2 * Math.PI * n, 0, v).intensity;
    expect(at(AIRY_DARK_V[0]) / at(0) / depth).toBeCloseTo(1, 2);
  });
});

describe('circularPattern', () => {
  /** The diffraction integral by Simpson's rule in ρ². */
  const integral = (u: number, taper: number, v: number) => {
    const panels = 4000;
    let re = 0;
    let im = 0;
    for (let index = 0; index <= panels; index += 1) {
      const square = index / panels;
      const weight = (index === 0 || index === panels ? 1 : index % 2 === 1 ? 4 : 2) / (3 * panels);
      const value = weight * besselJ(0, v * Math.sqrt(square)) * Math.exp(-taper * square);
      re += value * Math.cos((u * square) / 2);
      im -= value * Math.sin((u * square) / 2);
    }
    return re * re + im * im;
  };

  test.each([
    [0, 0, 2],
    [0, 0.09, 0],
    [0, 0.09, 6],
    [0, 2, 6],
    [0.0005, 0.0002, 3],
    [0.02, 0.01, 0.004],
    [1.3, 0.04, 1],
    [1.3, 0.04, 9],
    [6, 1, 6.2],
    [6, 1, 5.8],
    [12, 0.25, 3],
    [12, 0.25, 40],
  ])('agrees with the integral at u = %d, taper = %d, v = %d', (u, taper, v) => {
    expect(Math.abs(circularPattern(u, taper, v).intensity - integral(u, taper, v))).toBeLessThan(1e-11);
  });

  test.each([
    [0, 0, 2],
    [0.0004, 0.0002, 0.7],
    [0.0004, 0.0002, 5],
    [0.3, 0, 0.05],
    [0.3, 0.1, 4],
    [6, 1, 5],
    [12, 0.25, 40],
  ])('has exact derivatives at u = %d, taper = %d, v = %d', (u, taper, v) => {
    const pattern = circularPattern(u, taper, v);
    const step = 1e-4;
    const slope = (at: (shift: number) => number) => (-3 * at(0) + 4 * at(step) - at(2 * step)) / (2 * step);
    expect(Math.abs(pattern.byV - slope((shift) => circularPattern(u, taper, v + shift).intensity))).toBeLessThan(3e-8);
    expect(Math.abs(pattern.byU - slope((shift) => circularPattern(u + shift, taper, v).intensity))).toBeLessThan(3e-8);
    expect(Math.abs(pattern.byTaper - slope((shift) => circularPattern(u, taper + shift, v).intensity))).toBeLessThan(
      3e-8,
    );
  });

  test('has no step where it changes from one form to another', () => {
    for (const v of [0, 0.3, 0.99999, 1.00001, 4, 30]) {
      const below = circularPattern(0.0009999999, 0, v);
      const above = circularPattern(0.0010000001, 0, v);
      expect(Math.abs(below.intensity - above.intensity)).toBeLessThan(1e-12);
      expect(Math.abs(below.byV - above.byV)).toBeLessThan(1e-11);
      expect(Math.abs(below.byU - above.byU)).toBeLessThan(1e-8);
      expect(Math.abs(below.byTaper - above.byTaper)).toBeLessThan(1e-8);
    }
  });

  test('is the Airy pattern in the far field, and even in v', () => {
    for (const v of [0, 0.5, 2, 6.3, 50]) {
      expect(circularPattern(0, 0, v).intensity).toBeCloseTo(airyIntensity(v), 14);
      expect(circularPattern(0, 0, v).byV).toBeCloseTo(airyDerivative(v), 13);
      expect(circularPattern(2, 0.1, -v).intensity).toBe(circularPattern(2, 0.1, v).intensity);
      expect(circularPattern(2, 0.1, -v).byV).toBeCloseTo(-circularPattern(2, 0.1, v).byV, 15);
    }
  });

  test('fills a table', () => {
    const table = {
      intensity: new Float64Array(50),
      byV: new Float64Array(50),
      byU: new Float64Array(50),
      byTaper: new Float64Array(50),
    };
    tabulateCircularPattern(1.5, 0.02, 0.2, table);
    expect(table.intensity[37]).toBe(circularPattern(1.5, 0.02, 37 * 0.2).intensity);
    expect(table.byTaper[37]).toBe(circularPattern(1.5, 0.02, 37 * 0.2).byTaper);
  });

  // Shift of dark rings 1, 2 and 3 in percent with a Gaussian beam, far field (computed; cf. Urey, Appl. Opt. 43, 620
  // (2004), looked up).
  test.each([
    [0.05, 0, [0.034, 0.01, 0.005], 0.0006],
    [0.1, 0, [0.137, 0.041, 0.019], 0.0006],
    [0.2, 0, [0.549, 0.163, 0.077], 0.0006],
    [0.3, 0, [1.249, 0.368, 0.174], 0.0006],
    [0.5, 0, [3.59, 1.03, 0.49], 0.006],
    [1, 0, [16.9, 4.2, 2.0], 0.06],
    [0.2, 0.2, [0.578, 0.167, 0.078], 0.0006],
  ])('a/w = %d, N = %d: dark rings move by %p percent', (ratio, n, shifts, lastDigit) => {
    shifts.forEach((shift, index) => {
      const dark = AIRY_DARK_V[index];
      const place = findMinimum(
        (v) => circularPattern(2 * Math.PI * n, ratio ** 2, v).intensity,
        dark - 0.3,
        dark + 0.9,
      );
      expect(Math.abs(100 * (place / dark - 1) - shift)).toBeLessThan(lastDigit);
    });
  });
});

test('from the near-field Fresnel number on the first dark ring is filled to 6.6 % of the bright ring beside it (computed)', () => {
  const floorOverRing = (fresnel: number) => {
    const at = (v: number) => circularPattern(2 * Math.PI * fresnel, 0, v).intensity;
    const among = (from: number, to: number) =>
      Array.from({ length: 200 }, (_, k) => at(from + ((to - from) * k) / 200));
    return Math.min(...among(3.2, 4.6)) / Math.max(...among(4.6, 6));
  };
  expect(floorOverRing(NEAR_FIELD_FRESNEL_NUMBER)).toBeCloseTo(0.066, 3);
  expect(floorOverRing(0.04)).toBeCloseTo(0.0108, 3);
});
