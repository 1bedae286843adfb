import { darkRings, ringNear, stepRing } from '@/components/charts/ringChoice';
import { ringRows } from '@/components/viewer/ringRows';
import type { Ring } from '@/shared/contracts/measureResult';

const ring = (order: number, radiusMm: number, kind: Ring['kind'] = 'dark'): Ring => ({
  order,
  kind,
  radiusMm,
  uncertaintyMm: 1e-4,
  predictedMm: radiusMm,
  sizeUm: 100,
});
const rings = [ring(3, 2.04), ring(1, 0.77), ring(1, 1.03, 'bright'), ring(2, 1.41)];
const dark = darkRings(rings);

test('dark rings are listed by order', () => {
  expect(dark.map((r) => r.order)).toEqual([1, 2, 3]);
});

test('a touch takes the nearest ring within a fingertip, or none', () => {
  expect(ringNear(dark, 141, 100, 24)).toBe(2);
  expect(ringNear(dark, 120, 100, 24)).toBe(2);
  expect(ringNear(dark, 108, 100, 24)).toBeNull();
  expect(ringNear(dark, 80, 100, 24)).toBe(1);
});

test('arrows step outward and inward and stop at the ends', () => {
  expect(stepRing(dark, null, 1)).toBe(1);
  expect(stepRing(dark, null, -1)).toBe(3);
  expect(stepRing(dark, 1, 1)).toBe(2);
  expect(stepRing(dark, 3, 1)).toBe(3);
  expect(stepRing(dark, 1, -1)).toBe(1);
  expect(stepRing([], 1, 1)).toBeNull();
});

test('rows stand at the height of their rings where there is room', () => {
  const rows = ringRows(dark, 400, 100, 20, 400);
  expect(rows.get(1)).toBeCloseTo(400 - 77, 9);
  expect(rows.get(3)).toBeCloseTo(400 - 204, 9);
});

test('crowded rows are moved apart and stay within their bounds, outer above inner', () => {
  const close = Array.from({ length: 8 }, (_, i) => ring(i + 1, 0.1 * (i + 1)));
  const rows = ringRows(close, 390, 100, 20, 390);
  const ys = close.map((r) => rows.get(r.order)!);
  for (let i = 1; i < ys.length; i += 1) expect(ys[i - 1]! - ys[i]!).toBeGreaterThanOrEqual(31.999);
  expect(Math.min(...ys)).toBeGreaterThanOrEqual(20);
  expect(Math.max(...ys)).toBeLessThanOrEqual(390);
});
