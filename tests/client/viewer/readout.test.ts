import { modelAt, readoutAt } from '@/components/viewer/readout';

const plane = {
  widthPx: 4,
  heightPx: 3,
  data: Uint16Array.from({ length: 12 }, (_, i) => 100 + i),
  blackCount: 64,
  whiteCount: 4095,
};
const misfit = { widthPx: 4, heightPx: 3, bytes: Uint8Array.from({ length: 12 }, (_, i) => (i === 5 ? 0 : 128 + i)) };
const profile = {
  radiusMm: [0, 0.01],
  meanCounts: [9, 8],
  standardErrorCounts: [1, 1],
  pixelCount: [1, 1],
  modelCounts: [10, 20],
};
const measured = { centrePx: { x: 1, y: 1 }, rings: [], profile, pixelPitchUm: 5 };

test('a point reads the pixel whose area it lies in', () => {
  const r = readoutAt({ x: 2.4, y: 0.6 }, plane, misfit, measured);
  expect(r.counts).toBe(106);
  expect(r.aboveBlack).toBe(42);
  expect(r.misfit).toBeCloseTo(0.6, 12);
  expect(r.radiusMm).toBeCloseTo(Math.hypot(1.4, -0.4) * 0.005, 12);
  expect(r.angleDeg).toBeCloseTo((Math.atan2(0.4, 1.4) * 180) / Math.PI, 9);
});

test('a masked pixel has counts but no misfit', () => {
  const r = readoutAt({ x: 1, y: 1 }, plane, misfit, measured);
  expect([r.counts, r.misfit, r.masked]).toEqual([105, null, true]);
});

test('outside the frame there are no counts; without a measurement no radius', () => {
  expect(readoutAt({ x: -0.6, y: 0 }, plane, misfit, measured).counts).toBeNull();
  const r = readoutAt({ x: 0, y: 0 }, plane, null, null);
  expect([r.counts, r.radiusMm, r.modelCounts, r.misfit]).toEqual([100, null, null, null]);
});

test('the model is linear between bins and ends with the profile', () => {
  expect(modelAt(profile, 0.0025)).toBeCloseTo(12.5, 12);
  expect(modelAt(profile, 0.02)).toBeNull();
});
