import { lineProfile } from '../../../shared/optics/lineProfile';

/** Counts that rise by 10 a column and by 1 a row. */
const ramp = {
  widthPx: 40,
  heightPx: 30,
  data: Uint16Array.from({ length: 40 * 30 }, (_, at) => 100 + 10 * (at % 40) + Math.floor(at / 40)),
};

test('a horizontal line of one pixel returns the row itself', () => {
  const profile = lineProfile(ramp, { x0: 2, y0: 3, x1: 6, y1: 3, widthPx: 1 });
  expect(profile.distancePx).toEqual([0, 1, 2, 3, 4]);
  expect(profile.xPx).toEqual([2, 3, 4, 5, 6]);
  expect(profile.meanCounts).toEqual([123, 133, 143, 153, 163]);
  expect(profile.standardErrorCounts).toEqual([null, null, null, null, null]);
});

test('sub-pixel positions on an oblique line are exact on a plane of even slope', () => {
  const profile = lineProfile(ramp, { x0: 5.25, y0: 4.5, x1: 25.25, y1: 19.5, widthPx: 5 });
  expect(profile.distancePx).toHaveLength(26);
  profile.meanCounts.forEach((counts, index) => {
    expect(counts).toBeCloseTo(100 + 10 * profile.xPx[index] + profile.yPx[index], 9);
  });
});

test('the standard error is the scatter across the width over the root of the samples', () => {
  // Rows 9, 10 and 11 of an odd column: 10·x + {9, 10, 11} + 100, standard deviation 1, three samples.
  const profile = lineProfile(ramp, { x0: 0, y0: 10, x1: 3, y1: 10, widthPx: 3 });
  expect(profile.meanCounts).toEqual([110, 120, 130, 140]);
  profile.standardErrorCounts.forEach((error) => expect(error).toBeCloseTo(1 / Math.sqrt(3), 12));
});

test('outside the frame there is no mean, and a width half outside uses what is inside', () => {
  const profile = lineProfile(ramp, { x0: -3, y0: 0, x1: 2, y1: 0, widthPx: 3 });
  expect(profile.meanCounts.slice(0, 3)).toEqual([null, null, null]);
  expect(profile.meanCounts[3]).toBeCloseTo(100.5, 12);
  const corner = lineProfile(ramp, { x0: 39, y0: 29, x1: 39, y1: 29, widthPx: 1 });
  expect(corner.meanCounts).toEqual([100 + 390 + 29]);
});
