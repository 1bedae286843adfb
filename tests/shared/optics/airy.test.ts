import {
  AIRY_BRIGHT_V,
  AIRY_DARK_V,
  airyDerivative,
  airyEncircledEnergy,
  airyIntensity,
} from '../../../shared/optics/airy';
import { besselJ, besselSequence } from '../../../shared/optics/besselJ';

describe('besselJ', () => {
  // Abramowitz & Stegun, table 9.1 and 9.4 (from memory; computed to 30 digits).
  test.each([
    [0, 1, 0.765197686557967],
    [1, 1, 0.440050585744934],
    [2, 1, 0.114903484931901],
    [0, 10, -0.245935764451348],
    [2, 10, 0.254630313685121],
    [5, 1, 2.49757730211234e-4],
    [10, 10, 0.207486106633359],
    [20, 10, 1.15133692478134e-5],
    [3, 0, 0],
  ])('J%d(%d)', (order, x, value) => {
    expect(Math.abs(besselJ(order, x) - value)).toBeLessThan(3e-15 + 3e-14 * Math.abs(value));
    expect(besselJ(order, -x)).toBeCloseTo((order % 2 === 0 ? 1 : -1) * value, 14);
  });

  test('zeros of J0, J1 and J2 (A&S table 9.5, from memory; the first three of J1 printed in the SciPy manual, looked up)', () => {
    [2.404825557695773, 5.520078110286311, 8.653727912911013].forEach((zero) =>
      expect(Math.abs(besselJ(0, zero))).toBeLessThan(1e-15),
    );
    AIRY_DARK_V.forEach((zero) => expect(Math.abs(besselJ(1, zero))).toBeLessThan(5e-15));
    AIRY_BRIGHT_V.forEach((zero) => expect(Math.abs(besselJ(2, zero))).toBeLessThan(5e-15));
    expect(AIRY_DARK_V.slice(0, 3).map((zero) => zero.toFixed(8))).toEqual(['3.83170597', '7.01558667', '10.17346814']);
  });

  test.each([0.3, 5, 30, 200])('J0² + 2 Σ Jn² = 1 at %d (DLMF 10.23.3, from memory)', (x) => {
    const sequence = new Float64Array(Math.ceil(x) + 60);
    besselSequence(x, sequence);
    expect(sequence.reduce((sum, value, order) => sum + (order === 0 ? 1 : 2) * value * value, 0)).toBeCloseTo(1, 12);
  });
});

describe('Airy pattern', () => {
  // Born & Wolf 8.5.2, table 8.2 (from memory; computed): order, dark ring over π, energy inside, bright ring over π, its height.
  test.each([
    [1, 1.219669891, 0.8377848692, 1.63471935, 0.01749786279],
    [2, 2.233130594, 0.9099305351, 2.679292024, 0.004157996385],
    [3, 3.238315484, 0.9376474744, 3.698710321, 0.001600637668],
    [4, 4.241062864, 0.9523191693, 4.709697728, 0.000779445356],
    [5, 5.242764377, 0.9614013578, 5.716788099, 0.000437025552],
    [6, 6.24392169, 0.9675771809, 6.721748928, 0.00026928741],
    [7, 7.244759869, 0.9720493094, 7.725416688, 0.000177558499],
    [8, 8.245394914, 0.9754372787, 8.728239646, 0.000123204613],
    [9, 9.245892685, 0.9780927113, 9.730480004, 0.0000889643],
    [10, 10.24629335, 0.9802300095, 10.73230149, 0.0000663278],
  ])('ring %d', (order, dark, energy, bright, height) => {
    const darkV = AIRY_DARK_V[order - 1];
    const brightV = AIRY_BRIGHT_V[order - 1];
    expect(darkV / Math.PI).toBeCloseTo(dark, 8);
    expect(brightV / Math.PI).toBeCloseTo(bright, 8);
    expect(airyIntensity(darkV)).toBeLessThan(1e-28);
    expect(airyEncircledEnergy(darkV)).toBeCloseTo(energy, 9);
    expect(airyIntensity(brightV)).toBeCloseTo(height, 10);
    expect(Math.abs(airyDerivative(brightV))).toBeLessThan(1e-15);
  });

  // Computed to 25 digits.
  test.each([
    [1.616339948, 0.5],
    [1.91499205, Math.exp(-1)],
    [2.58383899, Math.exp(-2)],
  ])('level at v = %d', (v, level) => expect(airyIntensity(v)).toBeCloseTo(level, 9));

  test.each([
    [1.680224746, 0.5],
    [2.81782672, 0.8],
    [5.971187388, 0.9],
    [12.302070407, 0.95],
  ])('energy within v = %d', (v, part) => expect(airyEncircledEnergy(v)).toBeCloseTo(part, 9));

  test('its derivative is that of the intensity, through the axis', () => {
    for (const v of [-2, -0.011, -0.009, 0, 1e-5, 0.0099, 0.0101, 1, 4, 20]) {
      const step = 1e-4;
      const slope = (airyIntensity(v + step) - airyIntensity(v - step)) / (2 * step);
      expect(Math.abs(airyDerivative(v) - slope)).toBeLessThan(1e-8);
    }
  });
});
