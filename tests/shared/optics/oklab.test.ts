import { airyIntensity } from '../../../shared/optics/airy';
import {
  decodeSrgb,
  encodeSrgb,
  fromHex,
  linearSrgbToOklab,
  luminance,
  oklchToLinearSrgb,
  toHex,
} from '../../../shared/optics/oklab';

// Transfer function of IEC 61966-2-1 (looked up; computed).
test.each([
  [0.02, 0.0015479876],
  [0.1, 0.0100228256],
  [0.25, 0.0508760882],
  [0.5, 0.2140411405],
  [0.75, 0.522521554],
  [128 / 255, 0.2158605001],
])('sRGB %d is linear %d', (encoded, linear) => {
  expect(decodeSrgb(encoded)).toBeCloseTo(linear, 9);
  expect(encodeSrgb(linear)).toBeCloseTo(encoded, 7);
});

test('an encoded Airy pattern taken as linear: rings of 0.1405 and 0.0525, half-width 43 % too large (computed)', () => {
  expect(encodeSrgb(0.18)).toBeCloseTo(0.4613561, 7);
  expect(encodeSrgb(0.01749786279)).toBeCloseTo(0.1405, 4);
  expect(encodeSrgb(0.004157996385)).toBeCloseTo(0.0525, 3);
  let v = 1.6;
  while (encodeSrgb(airyIntensity(v)) > 0.5) v += 1e-4;
  expect(v / 1.616339948).toBeCloseTo(1.43, 2);
});

test('white and grey have no chroma, and colours come back', () => {
  const [lightness, a, b] = linearSrgbToOklab([1, 1, 1]);
  expect(lightness).toBeCloseTo(1, 6);
  expect(Math.hypot(a, b)).toBeLessThan(1e-6);
  expect(luminance([1, 1, 1])).toBeCloseTo(1, 6);
  for (const hex of ['#9C5CFF', '#00945E', '#C16C00', '#000000', '#FFFFFF']) {
    const [l, x, y] = linearSrgbToOklab(fromHex(hex));
    expect(toHex(oklchToLinearSrgb(l, Math.hypot(x, y), Math.atan2(y, x)))).toBe(hex);
  }
});
