import { gripAt, moveGrip } from '@/components/viewer/lineGrip';

const segment = { x0: 10, y0: 10, x1: 110, y1: 10, widthPx: 5 };
const place = { xPx: 5, yPx: 0, k: 2 };

test('an end is taken before the line, the line before nothing', () => {
  expect(gripAt(place, segment, { x: 28, y: 22 }, 24)).toBe('first');
  expect(gripAt(place, segment, { x: 225, y: 25 }, 24)).toBe('second');
  expect(gripAt(place, segment, { x: 120, y: 28 }, 24)).toBe('body');
  expect(gripAt(place, segment, { x: 120, y: 60 }, 24)).toBeNull();
});

test('ends stay on the frame; the line as a whole keeps its length', () => {
  expect(moveGrip(segment, 'first', -50, 5, 200, 100)).toEqual({ ...segment, x0: 0, y0: 15 });
  expect(moveGrip(segment, 'second', 500, 500, 200, 100)).toEqual({ ...segment, x1: 199, y1: 99 });
  const moved = moveGrip(segment, 'body', 500, -500, 200, 100);
  expect(moved.x1 - moved.x0).toBe(100);
  expect([moved.x1, moved.y0, moved.y1]).toEqual([199, 0, 0]);
});
