import { invertScaled, normalEquations } from '../../../shared/metrology/normalEquations';
import { leastSquares } from '../../../shared/metrology/leastSquares';
import { AIRY_DARK_V, airyDerivative, airyIntensity } from '../../../shared/optics/airy';
import { circularPattern } from '../../../shared/optics/circularPattern';

test('dark rings follow each other as 1.831, 2.655, 3.477 and 4.299 (computed): a missed first ring shows', () => {
  expect([1, 2, 3, 4].map((order) => (AIRY_DARK_V[order] / AIRY_DARK_V[0]).toFixed(3))).toEqual([
    '1.831',
    '2.655',
    '3.477',
    '4.299',
  ]);
});

describe('Cramér-Rao bound of the size, σ(D)/D = k/√N, amplitude and even background free (computed)', () => {
  // N electrons in the whole pattern, background β of the peak, light used from one v to another.
  const bound = (background: number, from: number, to: number) => {
    const steps = 20_000;
    const width = (to - from) / steps;
    const jacobian = new Float64Array(steps * 3);
    for (let index = 0; index < steps; index += 1) {
      const v = from + (index + 0.5) * width;
      // ∫ Airy · 2πv dv = 4π, so this is the light of one electron in the whole pattern.
      const area = (v * width) / 2;
      const root = Math.sqrt(area / (airyIntensity(v) + background));
      jacobian[index * 3] = airyIntensity(v) * root;
      jacobian[index * 3 + 1] = v * airyDerivative(v) * root;
      jacobian[index * 3 + 2] = root;
    }
    const inverse = invertScaled(normalEquations(jacobian, new Float64Array(steps), 3).matrix);
    return Math.sqrt(inverse?.get(1, 1) ?? NaN);
  };

  test.each([
    [1e-6, 1, 0.4167],
    [1e-4, 1, 0.4669],
    [1e-2, 1, 0.6886],
    [1e-5, 3, 0.2226],
    [1e-3, 3, 0.2802],
    [1e-6, 5, 0.1659],
    [1e-4, 5, 0.1928],
    [1e-4, 10, 0.1629],
    [1e-2, 10, 0.3755],
  ])('background %d, out to dark ring %d: %d', (background, ring, k) =>
    expect(bound(background, 0, AIRY_DARK_V[ring - 1])).toBeCloseTo(k, 3),
  );

  test.each([
    [2, 0.397],
    [3, 0.2867],
    [5, 0.2176],
    [10, 0.1772],
  ])('core masked, out to dark ring %d: %d', (ring, k) =>
    expect(bound(1e-4, AIRY_DARK_V[0], AIRY_DARK_V[ring - 1])).toBeCloseTo(k, 3),
  );
});

describe('what a plain Airy fit through dark ring 3, v up to 11, costs at a finite Fresnel number (computed)', () => {
  const count = 600;
  const places = Array.from({ length: count }, (_, index) => ((index + 0.5) / count) * 11);
  const bias = (n: number, weighting: 'poisson' | 'none') => {
    const y = places.map((v) => circularPattern(2 * Math.PI * n, 0, v).intensity);
    const peak = circularPattern(2 * Math.PI * n, 0, 0).intensity;
    const fit = leastSquares({
      parameters: [
        { name: 'scale', unit: '1', initialValue: 1 },
        { name: 'amplitude', unit: '1', initialValue: peak },
        { name: 'background', unit: '1', initialValue: 0 },
      ],
      y,
      // Rings of pixels: as many as v, each with its own noise.
      yUncertainty: places.map((v, index) => Math.sqrt((weighting === 'poisson' ? y[index] / peak + 1e-6 : 1) / v)),
      evaluate: ([scale, amplitude, background], model, jacobian) =>
        places.forEach((v, index) => {
          model[index] = amplitude * airyIntensity(scale * v) + background;
          jacobian?.set([amplitude * v * airyDerivative(scale * v), airyIntensity(scale * v), 1], 3 * index);
        }),
    });
    return 100 * (fit.parameters[0].value - 1);
  };

  // The tolerance is the last digit given; for Poisson weights more, as their floor is not stated.
  test.each([
    [0.01, -0.0006, 0.0001, 0.0003, 0.0002],
    [0.05, -0.015, 0.001, 0.005, 0.002],
    [0.1, -0.059, 0.001, 0.01, 0.002],
    [0.2, -0.24, 0.01, -0.029, 0.002],
    [0.3, -0.55, 0.01, -0.19, 0.02],
    [0.5, -1.7, 0.1, -0.94, 0.03],
  ])('N = %d: unweighted off by %d percent', (n, unweighted, digit, weighted, weightedDigit) => {
    expect(Math.abs(bias(n, 'none') - unweighted)).toBeLessThan(digit);
    expect(Math.abs(bias(n, 'poisson') - weighted)).toBeLessThan(weightedDigit);
  });
});
