import { seededRandom } from '../../../shared/metrology/seededRandom';

const COUNT = 40_000;

function moments(draw: () => number): { mean: number; variance: number; min: number; max: number } {
  const values = Array.from({ length: COUNT }, draw);
  const mean = values.reduce((sum, value) => sum + value, 0) / COUNT;
  const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (COUNT - 1);
  return { mean, variance, min: Math.min(...values), max: Math.max(...values) };
}

test('the same seed gives the same numbers and another seed gives others', () => {
  const first = seededRandom(7);
  const again = seededRandom(7);
  const other = seededRandom(8);
  const numbers = Array.from({ length: 20 }, () => first.uniform());
  expect(Array.from({ length: 20 }, () => again.uniform())).toEqual(numbers);
  expect(Array.from({ length: 20 }, () => other.uniform())).not.toEqual(numbers);
});

// Limits: four standard errors of the mean and of the variance of 40 000 draws.
test('uniform numbers fill the open interval evenly', () => {
  const { mean, variance, min, max } = moments(seededRandom(1).uniform);
  expect(Math.abs(mean - 0.5)).toBeLessThan(4 * Math.sqrt(1 / 12 / COUNT));
  expect(Math.abs(variance - 1 / 12)).toBeLessThan(4 * Math.sqrt(1 / 180 / COUNT));
  expect(min).toBeGreaterThan(0);
  expect(max).toBeLessThan(1);
});

test('normal numbers have mean 0 and variance 1', () => {
  const { mean, variance } = moments(seededRandom(2).normal);
  expect(Math.abs(mean)).toBeLessThan(4 / Math.sqrt(COUNT));
  expect(Math.abs(variance - 1)).toBeLessThan(4 * Math.sqrt(2 / COUNT));
});

test.each([0.5, 4])('gamma numbers of shape %d have mean k·θ and variance k·θ²', (shape) => {
  const random = seededRandom(3);
  const { mean, variance } = moments(() => random.gamma(shape, 0.25));
  expect(Math.abs(mean - shape * 0.25)).toBeLessThan(4 * 0.25 * Math.sqrt(shape / COUNT));
  const fourth = 3 * shape * (shape + 2) * 0.25 ** 4;
  expect(Math.abs(variance - shape * 0.0625)).toBeLessThan(4 * Math.sqrt((fourth - (shape * 0.0625) ** 2) / COUNT));
});

test("Student's t has variance ν/(ν − 2)", () => {
  const random = seededRandom(4);
  const { mean, variance } = moments(() => random.studentT(10));
  expect(Math.abs(mean)).toBeLessThan(4 * Math.sqrt(1.25 / COUNT));
  // Excess kurtosis 6/(ν − 4) = 1.
  expect(Math.abs(variance - 1.25)).toBeLessThan(4 * 1.25 * Math.sqrt(3 / COUNT));
});
