import { combineUncertainty } from '../../../shared/metrology/budget';
import { coverageFactor } from '../../../shared/metrology/coverageFactor';
import { propagateDistributions } from '../../../shared/metrology/monteCarlo';

describe('end gauge, JCGM 100:2008, H.1 (looked up in four implementations; computed)', () => {
  const lengthNm = 50_000_623;
  const inputs = [
    { name: 'standard', standardUncertainty: 25, sensitivity: 1, degreesOfFreedom: 18 },
    { name: 'difference', standardUncertainty: 9.7, sensitivity: 1, degreesOfFreedom: 25.6 },
    { name: 'expansion of the standard', standardUncertainty: 1.2e-6, sensitivity: 0, degreesOfFreedom: null },
    { name: 'temperature', standardUncertainty: 0.41, sensitivity: 0, degreesOfFreedom: null },
    {
      name: 'difference of expansion',
      standardUncertainty: 0.58e-6,
      sensitivity: -lengthNm * -0.1,
      degreesOfFreedom: 50,
    },
    {
      name: 'difference of temperature',
      standardUncertainty: 0.029,
      sensitivity: -lengthNm * 11.5e-6,
      degreesOfFreedom: 2,
    },
  ];

  test('combined standard uncertainty 32 nm (31.71), 16.66 degrees of freedom, t₉₉ 2.92, U₉₉ 93 nm', () => {
    const combined = combineUncertainty(inputs, { probability: 0.99 });
    expect(combined.standardUncertainty).toBeCloseTo(31.71, 1);
    expect(combined.effectiveDegreesOfFreedom).toBeCloseTo(16.7, 1);
    expect(combined.coverageFactor).toBeCloseTo(2.92, 2);
    expect(Math.round(combined.expandedUncertainty)).toBe(93);
    expect(combined.contributions.map(({ contribution }) => Number(contribution.toFixed(1)))).toEqual([
      25, 9.7, 0, 0, 2.9, 16.7,
    ]);
    expect(combined.dominant).toBe('standard');
  });

  test('the difference of the comparison: 5.8, 3.9 and 6.7 nm with 24, 5 and 8 degrees give 9.7 nm and 25.6', () => {
    const combined = combineUncertainty([
      { name: 'repeats', standardUncertainty: 5.8, sensitivity: 1, degreesOfFreedom: 24 },
      { name: 'random of the comparator', standardUncertainty: 3.9, sensitivity: 1, degreesOfFreedom: 5 },
      { name: 'systematic of the comparator', standardUncertainty: 6.7, sensitivity: 1, degreesOfFreedom: 8 },
    ]);
    expect(combined.standardUncertainty).toBeCloseTo(9.7, 1);
    expect(combined.effectiveDegreesOfFreedom).toBeCloseTo(25.6, 0);
  });

  test('Monte Carlo finds the second-order terms that the law of propagation leaves out: 34 nm (33.9), not 32', () => {
    const result = propagateDistributions(
      [
        { kind: 'student', mean: 50_000_623, standardUncertainty: 25, degreesOfFreedom: 18 },
        { kind: 'student', mean: 215, standardUncertainty: 9.7, degreesOfFreedom: 25.6 },
        { kind: 'rectangular', mean: 11.5e-6, halfWidth: 2e-6 },
        { kind: 'normal', mean: -0.1, standardUncertainty: 0.2 },
        { kind: 'arcsine', mean: 0, halfWidth: 0.5 },
        { kind: 'curvilinear-trapezoid', mean: 0, halfWidth: 1e-6, limitHalfWidth: 0.1e-6 },
        { kind: 'curvilinear-trapezoid', mean: 0, halfWidth: 0.05, limitHalfWidth: 0.025 },
      ],
      ([standard, difference, expansion, mean, swing, expansionDifference, temperatureDifference]) => {
        const temperature = mean + swing;
        return (
          (standard * (1 + expansion * (temperature + 0)) + difference) /
          (1 + (expansion + expansionDifference) * (temperature + temperatureDifference))
        );
      },
      { seed: 4, trials: 200_000, probability: 0.99 },
    );
    expect(result.mean).toBeCloseTo(50_000_838, -0.5);
    // JCGM 101:2008, 9.5: 36 nm with Student's t for the first two inputs (from memory), 33.9 with normal ones (computed).
    expect(result.standardUncertainty).toBeGreaterThan(34);
    expect(result.standardUncertainty).toBeLessThan(37);
  });
});

test('fully correlated inputs add linearly and can cancel: JCGM 100:2008, 5.2.2', () => {
  const inputs = [
    { name: 'a', standardUncertainty: 3, sensitivity: 1, degreesOfFreedom: null },
    { name: 'b', standardUncertainty: 4, sensitivity: -1, degreesOfFreedom: null },
  ];
  const combine = (coefficient: number) =>
    combineUncertainty(inputs, { correlations: [{ first: 'a', second: 'b', coefficient }] }).standardUncertainty;
  expect(combineUncertainty(inputs).standardUncertainty).toBe(5);
  expect(combine(1)).toBeCloseTo(1, 12);
  expect(combine(-1)).toBeCloseTo(7, 12);
  // Ten resistors of 1000 Ω ± 100 mΩ calibrated against one standard, in series: 1 Ω, not 0.32 Ω (5.2.2, from memory).
  const names = Array.from({ length: 10 }, (_, index) => `R${index}`);
  const series = combineUncertainty(
    names.map((name) => ({ name, standardUncertainty: 0.1, sensitivity: 1, degreesOfFreedom: null })),
    {
      correlations: names.flatMap((first, index) =>
        names.slice(index + 1).map((second) => ({ first, second, coefficient: 1 })),
      ),
    },
  );
  expect(series.standardUncertainty).toBeCloseTo(1, 12);
});

test('refuses a budget that cannot be', () => {
  const line = { name: 'a', standardUncertainty: 1, sensitivity: 1, degreesOfFreedom: null };
  expect(() => combineUncertainty([line, line])).toThrow(RangeError);
  expect(() => combineUncertainty([{ ...line, standardUncertainty: -1 }])).toThrow(RangeError);
  expect(() => combineUncertainty([line], { correlations: [{ first: 'a', second: 'b', coefficient: 0 }] })).toThrow(
    RangeError,
  );
  const three = ['a', 'b', 'c'].map((name) => ({ ...line, name }));
  const pairs = [
    ['a', 'b'],
    ['b', 'c'],
    ['a', 'c'],
  ];
  expect(() =>
    combineUncertainty(three, { correlations: pairs.map(([first, second]) => ({ first, second, coefficient: -1 })) }),
  ).toThrow('contradict');
});

test('example of a bench: distance dominates and U is 0.10 µm (computed)', () => {
  // 100 µm at 100.00 ± 0.05 mm, pitch 1e-4, radius 9e-5, wavelength 1.6e-6, illumination 3.6e-5, all relative.
  const combined = combineUncertainty(
    [
      ['distance', 5e-4],
      ['pixel-pitch', 1e-4],
      ['fit', 9e-5],
      ['wavelength', 1.6e-6],
      ['illumination', 3.6e-5],
    ].map(([name, relative]) => ({
      name: String(name),
      standardUncertainty: Number(relative),
      sensitivity: 100,
      degreesOfFreedom: null,
    })),
  );
  expect(combined.standardUncertainty / 100).toBeCloseTo(5.2e-4, 5);
  expect(combined.expandedUncertainty).toBeCloseTo(0.1, 2);
  expect(combined.dominant).toBe('distance');
});

// JCGM 100:2008, table G.2 (from memory).
test.each([
  [1, 0.95, 12.71],
  [2, 0.9545, 4.53],
  [5, 0.95, 2.57],
  [10, 0.9545, 2.28],
  [16, 0.99, 2.92],
  [16.9, 0.99, 2.92],
  [50, 0.9973, 3.16],
  [null, 0.9545, 2.0],
  [null, 0.95, 1.96],
  [null, 0.99, 2.576],
])('coverage factor for %s degrees of freedom at %d is %d', (degrees, probability, factor) => {
  expect(Math.abs(coverageFactor(degrees, probability) - factor)).toBeLessThan(0.0051);
});
