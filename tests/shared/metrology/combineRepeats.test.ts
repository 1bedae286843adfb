import { combineRepeats } from '../../../shared/metrology/combineRepeats';
import type { Repeat } from '../../../shared/metrology/combineRepeats';

const repeat = (sizeUm: number, fitUm: number, distanceUm: number, responseUm = 0): Repeat => ({
  sizeUm,
  budget: [
    { source: 'fit', contributionUm: fitUm, degreesOfFreedom: null },
    { source: 'distance', contributionUm: distanceUm, degreesOfFreedom: null },
    { source: 'pixel-response', contributionUm: responseUm, degreesOfFreedom: null },
  ],
});

test('the fit part shrinks with the root of the number, the distance stays', () => {
  const mean = combineRepeats([
    repeat(100.01, 0.02, 0.05),
    repeat(99.99, 0.02, 0.05),
    repeat(100.01, 0.02, 0.05),
    repeat(99.99, 0.02, 0.05),
  ]);
  expect(mean.count).toBe(4);
  expect(mean.sizeUm).toBeCloseTo(100, 9);
  expect(mean.scatterUncertaintyUm).toBeCloseTo(0.01, 9);
  expect(mean.commonUncertaintyUm).toBeCloseTo(0.05, 9);
  expect(mean.standardUncertaintyUm).toBeCloseTo(Math.hypot(0.01, 0.05), 9);
  expect(mean.coverageFactor).toBeCloseTo(2, 3);
  expect(mean.expandedUncertaintyUm).toBe(mean.coverageFactor * mean.standardUncertaintyUm);
});

test('a larger scatter than the fits state is believed, with the degrees of freedom it has', () => {
  // JCGM 100:2008, 4.2.3: standard deviation of the mean of 9, 10, 11 is 1/√3, with two degrees of freedom.
  const mean = combineRepeats([repeat(9, 0.01, 0), repeat(10, 0.01, 0), repeat(11, 0.01, 0)]);
  expect(mean.scatterUncertaintyUm).toBeCloseTo(1 / Math.sqrt(3), 9);
  expect(mean.effectiveDegreesOfFreedom).toBeCloseTo(2, 9);
  // t for 95.45 % and two degrees of freedom is 4.53 (JCGM 100:2008, table G.2, from memory).
  expect(mean.coverageFactor).toBeCloseTo(4.53, 2);
});

test('pixel response is common unless the pattern moved', () => {
  const repeats = [repeat(100, 0.01, 0, 0.04), repeat(100, 0.01, 0, 0.04)];
  expect(combineRepeats(repeats).commonUncertaintyUm).toBeCloseTo(0.04, 9);
  const moved = combineRepeats(repeats, { patternMoved: true });
  expect(moved.commonUncertaintyUm).toBeCloseTo(0, 9);
  expect(moved.scatterUncertaintyUm).toBeCloseTo(Math.hypot(0.01, 0.04) / Math.SQRT2, 9);
});

test('sharper fits weigh more, and one repeat is its own mean', () => {
  expect(combineRepeats([repeat(100, 0.01, 0), repeat(100.05, 0.02, 0)]).sizeUm).toBeCloseTo(100.01, 9);
  const single = combineRepeats([repeat(100, 0.03, 0.04)]);
  expect(single.sizeUm).toBe(100);
  expect(single.standardUncertaintyUm).toBeCloseTo(0.05, 12);
  expect(() => combineRepeats([])).toThrow(RangeError);
});
