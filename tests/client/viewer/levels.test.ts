import {
  countAt,
  countOfTone,
  countTable,
  fittingLevels,
  histogramBars,
  moveLevel,
  noiseFloor,
  toneOf,
  tones,
} from '@/components/viewer/levels';

const planeOf = (counts: readonly number[]) => ({
  widthPx: counts.length,
  heightPx: 1,
  data: Uint16Array.from(counts),
  blackCount: 64,
  whiteCount: 4095,
});

test('the table counts each count, up to the last of 16 bits', () => {
  const table = countTable(planeOf([0, 64, 64, 65535]));
  expect([table[0], table[64], table[65535], table[1]]).toEqual([1, 2, 1, 0]);
  expect(countAt(table, 0.5)).toBe(64);
  expect(countAt(table, 1)).toBe(65535);
});

test('fitting levels run from the darkest tenth to the brightest but one in ten thousand', () => {
  const counts = Array.from({ length: 20_000 }, (_, i) => (i === 0 ? 4000 : 64 + (i % 300)));
  expect(fittingLevels(countTable(planeOf(counts)), 64, 4095)).toEqual({ low: 93, high: 363 });
  expect(fittingLevels(countTable(planeOf(counts)), 110, 4095)).toEqual({ low: 110, high: 363 });
});

test('no more than three percent of the range is taken for background', () => {
  expect(fittingLevels(countTable(planeOf([4095, 4095])), 64, 4095)).toEqual({ low: 64 + 121, high: 4095 });
});

test('a frame without light stays dark: its levels span three percent of the range, and 16 counts at least', () => {
  const dark = countTable(planeOf([64, 66, 70]));
  expect(fittingLevels(dark, 64, 4095)).toEqual({ low: 64, high: 64 + 121 });
  expect(fittingLevels(dark, 64, 255)).toEqual({ low: 64, high: 80 });
});

test.each(tones)('%s tone runs from 0 to 1 and has an inverse', (tone) => {
  const levels = { low: 64, high: 3380 };
  expect(toneOf(0, levels, tone, 2)).toBe(0);
  expect(toneOf(64, levels, tone, 2)).toBe(0);
  expect(toneOf(3380, levels, tone, 2)).toBeCloseTo(1, 12);
  expect(toneOf(65535, levels, tone, 2)).toBeCloseTo(1, 12);
  for (const count of [65, 100, 1000, 3000]) {
    expect(countOfTone(toneOf(count, levels, tone, 2), levels, tone, 2)).toBeCloseTo(count, 6);
  }
});

test('handles do not cross and stay within the range', () => {
  const whole = { low: 60, high: 4095 };
  const levels = { low: 64, high: 3000 };
  expect(moveLevel(levels, 'low', 3500, whole)).toEqual({ low: 2992, high: 3000 });
  expect(moveLevel(levels, 'high', -5, whole)).toEqual({ low: 64, high: 72 });
  expect(moveLevel(levels, 'high', 99_999, whole)).toEqual({ low: 64, high: 4095 });
  expect(moveLevel(levels, 'low', 0, whole)).toEqual({ low: 60, high: 3000 });
});

test('bars hold every pixel and the fullest stands at 1', () => {
  const table = countTable(planeOf([64, 64, 64, 64, 4095]));
  const bars = histogramBars(table, { low: 64, high: 4095 }, 2, 10);
  expect(bars[0]).toBe(1);
  expect(bars[9]).toBeCloseTo(0.5, 12);
  expect(bars.slice(1, 9).every((b) => b === 0)).toBe(true);
});

test('noise comes from the pixels below black', () => {
  const counts = Array.from({ length: 400 }, (_, i) => 100 + (i % 2 === 0 ? 5 : -5));
  expect(noiseFloor(countTable(planeOf(counts)), 100)).toBeCloseTo(5, 12);
  expect(noiseFloor(countTable(planeOf([100, 100])), 100)).toBe(2);
});
