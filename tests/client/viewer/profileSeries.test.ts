import { countRange, profileSeries, reachMm } from '@/components/charts/profileSeries';
import { decimalsOf, decades, marks, niceStep } from '@/components/charts/scales';
import { pinnedNotes } from '@/components/charts/pinnedNotes';

const profile = {
  radiusMm: [0.1, 0.2, 0.3, 0.4],
  meanCounts: [100, 80, 10, 30],
  standardErrorCounts: [2, 2, 1, 1],
  pixelCount: [10, 30, 20, 20],
  modelCounts: [98, 82, 9, 31],
};

test('with room for each bin the bins are drawn as they are', () => {
  const series = profileSeries(profile, 100);
  expect(series.meanCounts).toEqual(profile.meanCounts);
  expect(series.misfit).toEqual([1, -1, 1, -1]);
});

test('joined bins count with their pixels and their error is that of the joined mean', () => {
  const series = profileSeries(profile, 20, 3);
  expect(series.meanCounts).toEqual([(10 * 100 + 30 * 80) / 40, 20]);
  expect(series.standardErrorCounts[0]).toBeCloseTo(Math.hypot(10 * 2, 30 * 2) / 40, 12);
  expect(series.misfit[0]).toBeCloseTo((85 - (980 + 2460) / 40) / (Math.hypot(20, 60) / 40), 9);
});

test('the range of counts holds the peak and begins about the noise', () => {
  const { from, to } = countRange(profile);
  expect(to).toBeGreaterThan(100);
  expect(from).toBeGreaterThan(0);
  expect(from).toBeLessThan(9);
});

test('the reach is a little past the last dark ring, or the whole profile without rings', () => {
  expect(reachMm(profile, [0.2, 0.3])).toBeCloseTo(0.3 * 1.058, 12);
  expect(reachMm(profile, [])).toBe(0.4);
  expect(reachMm(profile, [0.4])).toBeCloseTo(0.4, 12);
});

test('axis steps are 1, 2 or 5 times a power of ten and leave room for their numbers', () => {
  expect(niceStep(100, 56)).toBe(1);
  expect(niceStep(150, 56)).toBe(0.5);
  expect(niceStep(3, 56)).toBe(20);
  expect(marks(0, 1, 0.25)).toEqual([0, 0.25, 0.5, 0.75, 1]);
  expect([decimalsOf(1), decimalsOf(0.5), decimalsOf(0.02), decimalsOf(10)]).toEqual([0, 1, 2, 0]);
  expect(decades(0.35, 6000)).toEqual([1, 10, 100, 1000]);
});

test('what is pinned is named once for each measurement', () => {
  const point = (id: string, order: number, residual: number) => ({
    id,
    label: `P-${id}`,
    order,
    x: 1,
    residual,
    leftOut: false,
  });
  const notes = pinnedNotes(
    [point('a', 1, 1.1), point('a', 2, 1.1), point('b', 1, 0.1), point('c', 1, -0.9), point('c', 2, 0)],
    0.2,
    '%',
  );
  expect(notes.map((n) => n.text)).toEqual(['P-a, 1.1 % high on every ring', 'P-c, 0.9 % low on ring 1']);
});
