import { roundedAt } from '../../../server/analysis/calibrate/rounding';
import { seededRandom } from '../../../shared/metrology/seededRandom';
import { measuredOf, measureSimulated, SENSOR } from './simulatedCase';

test.each([
  [0.1, 4.5],
  [0.2, 7.3],
  [0.35, 12.85],
  [0.6, 3.1],
  [1.5, 9.4],
])('noise of %d counts about %d: mean and variance of whole counts', (sigma, level) => {
  const random = seededRandom(17);
  const draws = 200_000;
  let sum = 0;
  let squares = 0;
  for (let i = 0; i < draws; i++) {
    const count = Math.round(level + sigma * random.normal());
    sum += count;
    squares += count * count;
  }
  const mean = sum / draws;
  const rounded = roundedAt(level, sigma ** 2, { offset: 0, slope: 1, variance: 1 });
  // Four standard deviations of the mean of the draws, and the table's own steps.
  expect(Math.abs(level + rounded.offset - mean)).toBeLessThan(4 * Math.sqrt(rounded.variance / draws) + 5e-4);
  expect(Math.abs(rounded.variance - (squares / draws - mean * mean))).toBeLessThan(0.02 * rounded.variance + 2e-3);
});

// A fit that takes rounding for added noise is off by 0.2 % to several percent on such frames.
test.each([1, 2, 3, 4])(
  'an 8-bit frame with noise of a third of a count is measured without bias (seed %d)',
  async (seed) => {
    const sensor = { ...SENSOR, bitDepth: 8, electronsPerCount: 60, readNoiseElectrons: 18, blackCount: 6 };
    const result = measuredOf(await measureSimulated({ sensor, seed, peakElectrons: 12_000 }));
    expect(Math.abs(result.sizeUm / 200 - 1)).toBeLessThan(0.002);
    expect(Math.abs(result.sizeUm - 200)).toBeLessThan(3 * result.standardUncertaintyUm);
    expect(result.standardUncertaintyUm / 200).toBeLessThan(0.002);
  },
);
