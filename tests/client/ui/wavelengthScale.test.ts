import { wavelengthTicks, wavelengthX } from '@/components/ui/wavelengthScale';

test('380 to 720 nm fill the width between the margins', () => {
  expect(wavelengthX(380, 390, 16)).toBe(16);
  expect(wavelengthX(720, 390, 16)).toBe(374);
  expect(wavelengthX(550, 390, 16)).toBeCloseTo(195);
});

test('a laser outside the rule is held at its end', () => {
  expect(wavelengthX(1064, 390, 16)).toBe(374);
  expect(wavelengthX(266, 390, 16)).toBe(16);
});

test('the tick under the mark of the laser is left out', () => {
  const count = (path: string) => path.split('M').length - 1;
  expect(count(wavelengthTicks(1440, 24, 2, null))).toBe(171);
  expect(count(wavelengthTicks(1440, 24, 2, 632.8))).toBe(170);
});
