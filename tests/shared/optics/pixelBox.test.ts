import { AIRY_DARK_V, airyIntensity } from '../../../shared/optics/airy';
import { pixelBoxed } from '../../../shared/optics/pixelBox';
import { slitIntensity } from '../../../shared/optics/slit';
import { findMinimum } from './findExtremum';

const STEP = 0.02;
const airy = Float64Array.from({ length: 1200 }, (_, index) => airyIntensity(index * STEP));

/** Cubic through four entries of a table. */
function lookUp(table: Float64Array, v: number): number {
  const at = Math.floor(v / STEP);
  const t = v / STEP - at;
  const [before, here, after, beyond] = [table[at - 1], table[at], table[at + 1], table[at + 2]];
  return (
    (here * (1 + t) * (1 - t) * (2 - t)) / 2 +
    (after * (1 + t) * t * (2 - t)) / 2 -
    (before * t * (1 - t) * (2 - t)) / 6 -
    (beyond * t * (1 - t) * (1 + t)) / 6
  );
}

// q = p D / (λ z), so the pixel is π q wide in v. Shift of dark rings 1, 2 and 3 in percent (computed).
test.each([
  [0.05, [0.056, 0.017, 0.008]],
  [0.1, [0.225, 0.067, 0.032]],
  [0.2, [0.914, 0.276, 0.132]],
  [0.3, [2.11, 0.65, 0.31]],
])('a pixel of q = %d moves the dark rings by %p percent', (q, shifts) => {
  const boxed = pixelBoxed(airy, STEP, Math.PI * q);
  shifts.forEach((shift, index) => {
    const dark = AIRY_DARK_V[index];
    const place = findMinimum((v) => lookUp(boxed, v), dark - 0.2, dark + 0.3);
    const moved = 100 * (place / dark - 1);
    // Half of the last digit, and 2 % for terms of the sixth order at the widest pixel.
    expect(Math.abs(moved - shift)).toBeLessThan(0.0006 + (q > 0.15 ? 0.02 * shift : 0));
  });
});

test('the first minimum of a pixel of q = 0.1 is 3.6e-4 of the peak (computed)', () => {
  expect(lookUp(pixelBoxed(airy, STEP, 0.1 * Math.PI), AIRY_DARK_V[0] * 1.00225) / 3.6e-4).toBeCloseTo(1, 1);
});

test('agrees with the mean over a square pixel at any direction, averaged over directions', () => {
  const width = 0.2 * Math.PI;
  const boxed = pixelBoxed(airy, STEP, width);
  for (const radius of [0, 1, 3.84, 6, 9.4]) {
    let sum = 0;
    const directions = 24;
    const side = 40;
    for (let direction = 0; direction < directions; direction += 1) {
      const angle = ((direction + 0.5) * Math.PI) / 2 / directions;
      for (let row = 0; row < side; row += 1)
        for (let column = 0; column < side; column += 1) {
          const x = radius * Math.cos(angle) + ((column + 0.5) / side - 0.5) * width;
          const y = radius * Math.sin(angle) + ((row + 0.5) / side - 0.5) * width;
          sum += airyIntensity(Math.hypot(x, y));
        }
    }
    const mean = sum / (directions * side * side);
    expect(Math.abs(boxed[Math.round(radius / STEP)] - mean)).toBeLessThan(2e-5);
  }
});

test('a pixel of q = 0.1 across a slit pattern moves its minima by 0.251, 0.063 and 0.028 percent (computed)', () => {
  const width = 0.1 * Math.PI;
  const mean = (beta: number) => {
    let sum = 0;
    for (let at = 0; at < 200; at += 1) sum += slitIntensity(beta + ((at + 0.5) / 200 - 0.5) * width) / 200;
    return sum;
  };
  [0.251, 0.063, 0.028].forEach((shift, index) => {
    const dark = (index + 1) * Math.PI;
    expect(Math.abs(100 * (findMinimum(mean, dark - 0.1, dark + 0.2) / dark - 1) - shift)).toBeLessThan(0.0006);
  });
});

// Linear background of slope g times the peak a λz/D: shift of dark rings 1, 2 and 3 in percent (computed).
test.each([
  [1e-5, [-0.001, -0.003, -0.006]],
  [1e-4, [-0.009, -0.031, -0.065]],
  [1e-3, [-0.094, -0.306, -0.633]],
])('a background slope of %d moves the dark rings by %p percent', (slope, shifts) => {
  shifts.forEach((shift, index) => {
    const dark = AIRY_DARK_V[index];
    const place = findMinimum((v) => airyIntensity(v) + (slope * v) / Math.PI, dark - 0.2, dark + 0.2);
    expect(Math.abs(100 * (place / dark - 1) - shift)).toBeLessThan(0.0006);
  });
});
