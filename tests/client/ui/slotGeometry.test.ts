import { slotPlace, slotScale } from '@/components/ui/slotGeometry';

const limits = { lower: 99, upper: 101 };

test('the scale is the gap and a quarter of it on either side', () => {
  const scale = slotScale(limits, 300);
  expect([scale.min, scale.max]).toEqual([98.5, 101.5]);
  expect(scale.x(98.5)).toBe(0);
  expect(scale.x(99)).toBeCloseTo(50);
  expect(scale.x(100)).toBeCloseTo(150);
  expect(scale.x(101)).toBeCloseTo(250);
});

test('a mark beyond the scale is held at the end and says so', () => {
  const scale = slotScale(limits, 300);
  expect(scale.x(140)).toBe(300);
  expect(scale.x(2)).toBe(0);
  expect(scale.pinned(140)).toBe(true);
  expect(scale.pinned(101.4)).toBe(false);
});

test('one wall alone leaves room for the values on the open side', () => {
  const scale = slotScale({ lower: null, upper: 2 }, 200, [0.4]);
  expect(scale.x(0.4)).toBeGreaterThan(0);
  expect(scale.x(2)).toBeLessThan(200);
  expect(scale.x(2)).toBeGreaterThan(scale.x(0.4));
});

test('a tolerance of nothing still has a scale', () => {
  const scale = slotScale({ lower: 100, upper: 100 }, 200, [100.2]);
  expect(scale.x(100)).toBeCloseTo(100);
  expect(scale.x(100.2)).toBeGreaterThan(100);
  expect(scale.x(100.2)).toBeLessThan(200);
});

test.each([
  [100.37, 0.11, 'inside'],
  [100.94, 0.11, 'across'],
  [101.05, 0.11, 'across'],
  [101.42, 0.11, 'above'],
  [98.5, 0.11, 'below'],
  [100.89, 0.11, 'inside'],
] as const)('%d ± %d lies %s', (value, uncertainty, place) => {
  expect(slotPlace(limits, value, uncertainty)).toBe(place);
});

test('with one wall only that wall counts', () => {
  expect(slotPlace({ lower: null, upper: 2 }, -50, 0.1)).toBe('inside');
  expect(slotPlace({ lower: 2, upper: null }, 1, 0.1)).toBe('below');
});
