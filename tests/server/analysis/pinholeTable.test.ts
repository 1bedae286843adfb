import { COLUMNS, intensityAt, pinholeTable, TABLE_STEP } from '../../../server/analysis/models/pinholeTable';
import { fresnelCircleIrradiance } from '../../../shared/optics/lommel';

const airy = pinholeTable({ u: 0, illumination: 0, pixelV: 0 }, 40);

// Rings of the Airy pattern: Born & Wolf, Principles of Optics, §8.5.2, table 8.2 (from memory); zeros and maxima of the
// Bessel functions: Abramowitz & Stegun, table 9.5 (from memory). All digits computed.
test.each([
  [0, 1],
  [3.831705970207512, 0],
  [5.135622301840683, 0.01749786279],
  [7.015586669815619, 0],
  [8.417244140399865, 0.004157996385],
  [10.17346813506272, 0],
  [11.61984117214906, 0.001600637668],
  [14.79595178235126, 0.000779445356],
  [33.7165195092227, 0.0000663278],
])('far field: intensity at v = %d is %d', (v, intensity) => {
  // Interpolation in steps of 0.05 is good to 1e-8 of the peak.
  expect(Math.abs(intensityAt(airy, v) - intensity)).toBeLessThan(1e-8);
});

// Irradiance over the incident one behind a circular hole, by direct integration and by Lommel's series (computed).
const NEAR_FIELD: [fresnelNumber: number, values: number[]][] = [
  [
    0.1,
    [
      0.09788696741, 0.07582409869, 0.03259206858, 0.005093825733, 1.16719866e-4, 0.001754394016, 5.857320632e-6,
      8.398195213e-6,
    ],
  ],
  [0.5, [2.0, 1.55082928, 0.6840207572, 0.1536116155, 0.06490432671, 0.07560363818, 0.004505988154, 8.639921112e-4]],
  [1, [4.0, 3.116853237, 1.538084768, 0.7697477669, 0.7117192238, 0.5314750109, 0.09886703289, 0.01657576146]],
  [2, [0, 0.05512486055, 0.6010984977, 1.572840055, 1.935601672, 1.497914004, 1.380370097, 0.4780207156]],
  [4, [0, 0.05513030986, 0.6020335704, 1.583996915, 1.959652556, 1.415787344, 0.7363645139, 0.8279681552]],
];
const PLACES = [0, 1, 2, 3, 3.8317059702, 5, 7.0155866698, 10];

test.each(NEAR_FIELD)('near field, Fresnel number %d', (fresnelNumber, values) => {
  const u = 2 * Math.PI * fresnelNumber;
  const table = pinholeTable({ u, illumination: 0, pixelV: 0 }, 12);
  PLACES.forEach((v, i) => {
    // In units of the incident irradiance the interpolation's 1e-8 grows by (u/2)².
    expect(Math.abs((u / 2) ** 2 * intensityAt(table, v) - values[i])).toBeLessThan(1e-8 * Math.max(1, (u / 2) ** 2));
  });
});

test('agrees with the closed Lommel form over the whole table', () => {
  const u = 2.7;
  const table = pinholeTable({ u, illumination: 0, pixelV: 0 }, 60);
  for (let v = 0.025; v < 60; v += 0.37) {
    const closed = fresnelCircleIrradiance(u, v) / (u / 2) ** 2;
    expect(Math.abs(intensityAt(table, v) - closed)).toBeLessThan(1e-8);
  }
});

test('derivatives agree with differences of the table', () => {
  const state = { u: 0.6, illumination: 0.1, pixelV: 0.2 };
  const table = pinholeTable(state, 50);
  const e = 1e-4;
  const scaled = (factor: number) =>
    pinholeTable(
      { u: state.u * factor ** 2, illumination: state.illumination * factor ** 2, pixelV: state.pixelV * factor },
      52,
    );
  const [up, down] = [scaled(1 + e), scaled(1 - e)];
  const more = pinholeTable({ ...state, illumination: state.illumination + e }, 52);
  const less = pinholeTable({ ...state, illumination: state.illumination - e }, 52);
  for (let row = 0; row < 900; row += 37) {
    const v = row * TABLE_STEP;
    const at = row * COLUMNS;
    // Differences of a step of 1e-4 are good to about 1e-6, the pixel's square in the derivatives to 1e-7.
    expect(
      Math.abs(table[at + 3] - (intensityAt(up, v * (1 + e)) - intensityAt(down, v * (1 - e))) / (2 * e)),
    ).toBeLessThan(5e-6);
    expect(Math.abs(table[at + 4] - (intensityAt(more, v) - intensityAt(less, v)) / (2 * e))).toBeLessThan(5e-6);
  }
});

/** Place of the first dark ring near its place for even light and small pixels. */
function darkRing(table: Float64Array, near: number): number {
  let best = near;
  for (let v = near * 0.97; v < near * 1.06; v += 1e-4) if (intensityAt(table, v) < intensityAt(table, best)) best = v;
  return best;
}

// Shift of the first dark ring in percent (computed, to the last digit given).
test.each([
  [0.1, 0.137],
  [0.2, 0.549],
  [0.3, 1.249],
])('Gaussian light with a/w = %d widens the first dark ring by %d %%', (ratio, percent) => {
  const table = pinholeTable({ u: 0, illumination: ratio ** 2, pixelV: 0 }, 12);
  expect(100 * (darkRing(table, 3.8317059702) / 3.8317059702 - 1)).toBeCloseTo(percent, 2);
});

test.each([
  [0.05, 0.056],
  [0.1, 0.225],
  [0.2, 0.914],
])('pixels of %d λz/D widen the first dark ring by %d %%', (q, percent) => {
  const table = pinholeTable({ u: 0, illumination: 0, pixelV: Math.PI * q }, 12);
  expect(100 * (darkRing(table, 3.8317059702) / 3.8317059702 - 1)).toBeCloseTo(percent, 2);
});
