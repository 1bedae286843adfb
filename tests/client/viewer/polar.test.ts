import { fromPolar, toPolar } from '@/components/viewer/polar';

const centre = { x: 100.5, y: 200.25 };

test('angles run counter-clockwise as seen, from the direction of x', () => {
  expect(toPolar(centre, { x: 110.5, y: 200.25 })).toEqual({ radiusPx: 10, angleDeg: 0 });
  expect(toPolar(centre, { x: 100.5, y: 190.25 }).angleDeg).toBeCloseTo(90, 9);
  expect(toPolar(centre, { x: 90.5, y: 200.25 }).angleDeg).toBeCloseTo(180, 9);
  expect(toPolar(centre, { x: 100.5, y: 210.25 }).angleDeg).toBeCloseTo(270, 9);
});

test('polar and frame points turn into each other', () => {
  for (const angleDeg of [0.4, 33, 179.9, 269.5, 359]) {
    const point = fromPolar(centre, { radiusPx: 57.3, angleDeg });
    const polar = toPolar(centre, point);
    expect(polar.radiusPx).toBeCloseTo(57.3, 9);
    expect(polar.angleDeg).toBeCloseTo(angleDeg, 9);
  }
});
