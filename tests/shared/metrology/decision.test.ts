import { conformanceProbability, decide, decisionRisks, DEFAULT_RULE } from '../../../shared/metrology/decision';
import { normalDensity, normalProbability } from '../../../shared/metrology/normalDistribution';

// Tails used for guard bands (computed).
test.each([
  [-2, 0.0227501319],
  [-3, 0.00134989803],
  [-6, 9.86587645e-10],
  [-1.66, 0.0484572263],
  [0, 0.5],
  [1.96, 0.9750021049],
])('normal probability at %d', (z, probability) => {
  expect(normalProbability(z) / probability).toBeCloseTo(1, 8);
  expect(normalProbability(z) + normalProbability(-z)).toBeCloseTo(1, 14);
});

describe('conformance probability, JCGM 106:2012', () => {
  test('7.3.3 breakdown voltage −5.47 V, u 0.05 V, at most −5.40 V: 0.92 (0.9192)', () => {
    expect(conformanceProbability(-5.47, 0.05, { lower: null, upper: -5.4 })).toBeCloseTo(0.9192, 4);
  });
  test('7.3.3 container 509.7 kPa, u 8.6 kPa, at least 490 kPa: 0.99 (0.9890)', () => {
    expect(conformanceProbability(509.7, 8.6, { lower: 490, upper: null })).toBeCloseTo(0.989, 4);
  });
  test('7.4 value 13.6, u 1.8, limits 12.5 and 16.3: 0.66 (0.66263) (looked up; computed)', () => {
    expect(conformanceProbability(13.6, 1.8, { lower: 12.5, upper: 16.3 })).toBeCloseTo(0.66263, 5);
  });
});

describe('decide', () => {
  const limits = { lower: 99, upper: 101 };

  test('the default guard band is 1.65 standard uncertainties, 95 % at one limit', () => {
    expect(DEFAULT_RULE).toMatchObject({ kind: 'guarded' });
    const { guardBand, acceptance } = decide(100, 0.1, limits);
    expect(guardBand).toBeCloseTo(0.1645, 3);
    expect(acceptance.lower).toBeCloseTo(99.1645, 3);
    expect(conformanceProbability(99 + guardBand, 0.1, limits)).toBeCloseTo(0.95, 6);
  });

  test.each([
    [100, 'conforms'],
    [100.83, 'conforms'],
    [100.84, 'undecided'],
    [101.16, 'undecided'],
    [101.17, 'does not conform'],
    [98.9, 'undecided'],
    [98.8, 'does not conform'],
  ])('%d ± 0.1 within 99 to 101: %s', (value, verdict) => expect(decide(value, 0.1, limits).verdict).toBe(verdict));

  test('simple acceptance is never undecided and counts the limit as inside', () => {
    expect(decide(101, 0.1, limits, { kind: 'simple' }).verdict).toBe('conforms');
    expect(decide(101.001, 0.1, limits, { kind: 'simple' }).verdict).toBe('does not conform');
  });

  test('an uncertainty as large as the tolerance can prove nothing within it', () => {
    const decision = decide(100, 1, limits);
    expect(decision.verdict).toBe('undecided');
    expect(decision.acceptance.lower as number).toBeGreaterThan(decision.acceptance.upper as number);
  });

  test('a speed limit of 100 km/h, measured to 2 %, is broken with 99.9 % from 107 km/h on (106.6): JCGM 106:2012, clause 8 (from memory; computed)', () => {
    // u = 0.02 v: v − 3.09 · 0.02 v = 100.
    const broken = (speed: number) => 1 - conformanceProbability(speed, 0.02 * speed, { lower: null, upper: 100 });
    expect(broken(107)).toBeGreaterThan(0.999);
    expect(broken(106.5)).toBeLessThan(0.999);
  });

  test('refuses limits that are none', () => {
    expect(() => decide(1, 1, { lower: null, upper: null })).toThrow(RangeError);
    expect(() => decide(1, 1, { lower: 2, upper: 2 })).toThrow(RangeError);
    expect(() => decide(1, 0, limits)).toThrow(RangeError);
  });
});

describe('global risks', () => {
  // JCGM 106:2012, 9.5.4 (looked up; computed): runout of bearings, gamma with shape 4 and scale ¼ µm, limit 2 µm, u 0.25 µm.
  const gamma = (value: number) => (value <= 0 ? 0 : (256 / 6) * value ** 3 * Math.exp(-4 * value));

  test('bearings accepted up to the limit: 4.24 % do not conform, consumer 0.80 %, producer 1.74 %', () => {
    const risks = decisionRisks(gamma, [0, 12], 0.25, { lower: null, upper: 2 }, { lower: null, upper: 2 });
    expect(risks.nonconforming).toBeCloseTo(0.0424, 4);
    expect(risks.consumer).toBeCloseTo(0.0080191, 6);
    expect(risks.producer).toBeCloseTo(0.0174, 4);
  });

  test('bearings accepted up to 1.6718 µm: consumer 0.1 %, producer 7.55 %', () => {
    const risks = decisionRisks(gamma, [0, 12], 0.25, { lower: null, upper: 2 }, { lower: null, upper: 1.6718 });
    expect(risks.consumer).toBeCloseTo(0.001, 6);
    expect(risks.producer).toBeCloseTo(0.0755, 4);
  });

  // Deaver (looked up; computed): normal process of standard deviation 1, measured with 1/TUR, limits ± SL.
  test.each([
    [2, 4, 1, 0.008, 0.0149],
    [2.5, 4, 1, 0.00245, null],
    [2.5, 1, 1, 0.0047, null],
    [2, 2, 0.91, 0.0081, 0.0661],
  ])('limits ± %d, ratio %d, acceptance %d of the limits', (limit, ratio, part, consumer, producer) => {
    const uncertainty = 1 / ratio;
    const risks = decisionRisks(
      normalDensity,
      [-9, 9],
      uncertainty,
      { lower: -limit, upper: limit },
      { lower: -part * limit, upper: part * limit },
    );
    expect(Math.abs(risks.consumer - consumer)).toBeLessThan(0.0001);
    if (producer !== null) expect(Math.abs(risks.producer - producer)).toBeLessThan(0.0001);
  });
});
