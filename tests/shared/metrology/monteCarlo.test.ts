import { intervalsAgree, monteCarlo, propagateDistributions } from '../../../shared/metrology/monteCarlo';
import type { InputDistribution } from '../../../shared/metrology/monteCarlo';

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const rectangular = (standardUncertainty: number): InputDistribution => ({
  kind: 'rectangular',
  mean: 0,
  halfWidth: standardUncertainty * Math.sqrt(3),
});

describe('additive model, JCGM 101:2008, 9.2 (from memory; computed)', () => {
  test('four normal inputs: u 2.00, interval ± 3.92', () => {
    const inputs = Array.from({ length: 4 }, (): InputDistribution => ({
      kind: 'normal',
      mean: 0,
      standardUncertainty: 1,
    }));
    const result = propagateDistributions(inputs, sum, { seed: 1, probability: 0.95, trials: 200_000 });
    expect(result.standardUncertainty).toBeCloseTo(2, 1.7);
    expect(result.symmetricInterval[0]).toBeCloseTo(-3.92, 1.3);
    expect(result.symmetricInterval[1]).toBeCloseTo(3.92, 1.3);
    expect(intervalsAgree(0, 2, 3.92, result.symmetricInterval).agree).toBe(true);
  });

  test('four rectangular inputs: u 2.00, interval ± 3.88 (3.879), narrower than the ± 3.92 of the law of propagation', () => {
    const result = propagateDistributions([1, 1, 1, 1].map(rectangular), sum, {
      seed: 2,
      probability: 0.95,
      trials: 200_000,
    });
    expect(Math.abs(result.standardUncertainty - 2)).toBeLessThan(0.01);
    expect(Math.abs(result.symmetricInterval[0] + 3.879)).toBeLessThan(0.02);
    expect(Math.abs(result.symmetricInterval[1] - 3.879)).toBeLessThan(0.02);
    const length = result.shortestInterval[1] - result.shortestInterval[0];
    expect(length).toBeLessThanOrEqual(result.symmetricInterval[1] - result.symmetricInterval[0]);
  });

  test('one input ten times the others: u 10.15, interval ± 17.0 where the law of propagation says ± 19.9', () => {
    const result = propagateDistributions([10, 1, 1, 1].map(rectangular), sum, {
      seed: 3,
      probability: 0.95,
      trials: 200_000,
    });
    expect(Math.abs(result.standardUncertainty - Math.sqrt(103))).toBeLessThan(0.03);
    expect(Math.abs(result.symmetricInterval[1] - 17.01)).toBeLessThan(0.05);
    expect(intervalsAgree(0, Math.sqrt(103), 19.9, result.symmetricInterval)).toEqual({ agree: false, tolerance: 0.5 });
  });
});

test.each<[InputDistribution, number]>([
  [{ kind: 'triangular', mean: 5, halfWidth: 1 }, 1 / Math.sqrt(6)],
  [{ kind: 'arcsine', mean: 5, halfWidth: 1 }, 1 / Math.sqrt(2)],
  [{ kind: 'student', mean: 5, standardUncertainty: 1, degreesOfFreedom: 18 }, Math.sqrt(18 / 16)],
  // (a² + d²/3)/3: JCGM 101:2008, 6.4.3.3 (derived).
  [{ kind: 'curvilinear-trapezoid', mean: 5, halfWidth: 1, limitHalfWidth: 0.5 }, Math.sqrt((1 + 0.25 / 3) / 3)],
])('an input of %j has standard uncertainty %d', (input, expected) => {
  const result = propagateDistributions([input], ([value]) => value, { seed: 9, trials: 100_000 });
  expect(Math.abs(result.mean - 5)).toBeLessThan((4 * expected) / Math.sqrt(100_000));
  expect(Math.abs(result.standardUncertainty / expected - 1)).toBeLessThan(0.015);
});

test('the shortest interval of a skew result leans to where it is dense', () => {
  const result = monteCarlo((random) => -Math.log(random.uniform()), { seed: 5, probability: 0.95, trials: 200_000 });
  // Exponential: shortest from 0 to ln 20.
  expect(result.shortestInterval[0]).toBeLessThan(0.01);
  expect(result.shortestInterval[1]).toBeCloseTo(Math.log(20), 1);
  expect(result.symmetricInterval[0]).toBeCloseTo(-Math.log(0.975), 2);
  expect(monteCarlo((random) => random.normal(), { seed: 6, trials: 1000 })).toEqual(
    monteCarlo((random) => random.normal(), { seed: 6, trials: 1000 }),
  );
  expect(() => monteCarlo(() => NaN, { seed: 1, trials: 1000 })).toThrow(RangeError);
});
