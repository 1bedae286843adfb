import { hold, pan, placeCentre, placeWhole, toFrame, toSheet, zoomAbout, type Box } from '@/components/viewer/place';

const box: Box = { left: 10, top: 20, width: 400, height: 300 };

test('the whole frame stands in the middle of its box, outer pixel edges inside', () => {
  const place = placeWhole(box, 1000, 500);
  expect(place.k).toBeCloseTo(0.4, 12);
  const topLeft = toSheet(place, { x: -0.5, y: -0.5 });
  const bottomRight = toSheet(place, { x: 999.5, y: 499.5 });
  expect(topLeft.x).toBeCloseTo(10, 9);
  expect(bottomRight.x).toBeCloseTo(410, 9);
  expect(topLeft.y - 20).toBeCloseTo(320 - bottomRight.y, 9);
});

test('the fitted centre stands where it is put and a radius reaches as far as asked', () => {
  const place = placeCentre({ x: 640.12, y: 511.87 }, { x: 84, y: 154 }, 620, 300);
  expect(toSheet(place, { x: 640.12, y: 511.87 })).toEqual({ x: 84, y: 154 });
  expect(toSheet(place, { x: 640.12 + 620, y: 511.87 }).x).toBeCloseTo(384, 9);
});

test('sheet and frame points turn into each other', () => {
  const place = { xPx: -31.5, yPx: 12.25, k: 0.37 };
  const back = toFrame(place, toSheet(place, { x: 123.4, y: 567.8 }));
  expect(back.x).toBeCloseTo(123.4, 9);
  expect(back.y).toBeCloseTo(567.8, 9);
});

test('magnifying keeps the frame point under the pointer, also at the limits', () => {
  const place = { xPx: 3, yPx: 4, k: 0.5 };
  const at = { x: 200, y: 100 };
  for (const factor of [1.7, 0.2, 1000]) {
    const next = zoomAbout(place, at, factor, 0.25);
    expect(toFrame(next, at).x).toBeCloseTo(toFrame(place, at).x, 9);
    expect(toFrame(next, at).y).toBeCloseTo(toFrame(place, at).y, 9);
  }
  expect(zoomAbout(place, at, 0.001, 0.25).k).toBe(0.25);
  expect(zoomAbout(place, at, 1e6, 0.25).k).toBe(48);
});

test('a frame cannot be pushed out of sight', () => {
  const place = placeWhole(box, 1000, 500);
  const far = pan(place, 1e5, -1e5, box, 1000, 500);
  expect(far.xPx).toBe(10 + 400 - 40);
  expect(far.yPx + far.k * 500).toBeCloseTo(20 + 40, 9);
  expect(hold(place, box, 1000, 500)).toEqual(place);
});
