import {
  airRefractiveIndex,
  HELIUM_NEON_VACUUM,
  STANDARD_AIR,
  wavelengthInAir,
} from '../../../shared/optics/airRefractiveIndex';
import { fresnelNumber } from '../../../shared/optics/fresnelNumber';
import {
  opticalDistanceMm,
  radiusOfReduced,
  radiusOfSinTheta,
  reducedRadius,
  sinThetaOfRadius,
  sizeOfRing,
} from '../../../shared/optics/geometry';

test('radius and sin θ belong to each other exactly', () => {
  for (const radius of [0, 0.5, 20, 400])
    expect(radiusOfSinTheta(sinThetaOfRadius(radius, 100), 100)).toBeCloseTo(radius, 9);
  expect(radiusOfSinTheta(1, 100)).toBe(Infinity);
  expect(sinThetaOfRadius(30, 40)).toBeCloseTo(0.6, 15);
});

// Diameter too small by this part when r/z is used for sin θ (computed).
test.each([
  [0.01, 0.00005],
  [0.05, 0.00125],
  [0.1, 0.00496],
  [0.2, 0.0194],
])('obliquity at r/z = %d', (ratio, part) => {
  expect(1 - sinThetaOfRadius(ratio, 1) / ratio).toBeCloseTo(part, 4);
});

test('first dark ring of a 100 µm hole at 100 mm in red light lies at 0.772 mm, and gives the size back', () => {
  // Bench example, computed: 224 pixels of 3.45 µm.
  const radius = radiusOfReduced(3.831705970207512, 100, 632.8, 100);
  expect(radius).toBeCloseTo(0.772, 3);
  expect(Math.round(radius / 0.00345)).toBe(224);
  expect(reducedRadius(radius, 100, 632.8, 100)).toBeCloseTo(3.831705970207512, 12);
  expect(sizeOfRing(3.831705970207512, radius, 632.8, 100)).toBeCloseTo(100, 10);
  expect(radiusOfReduced(50, 5, 632.8, 100)).toBe(Infinity);
});

test('published exercise: wavelength 560 nm, 0.20 mm hole, 2 m away: first dark radius 6.83 mm (looked up)', () => {
  expect(radiusOfReduced(3.831705970207512, 200, 560, 2000)).toBeCloseTo(6.83, 2);
});

test('half a millimetre of glass of index 1.515 brings the pattern nearer by 0.17 mm (computed)', () => {
  expect(100 - opticalDistanceMm(100, 0.5, 1.515)).toBeCloseTo(0.17, 3);
  expect(opticalDistanceMm(100)).toBe(100);
  expect(opticalDistanceMm(100, null, 1.5)).toBe(100);
});

test('Fresnel numbers', () => {
  // The far distance 2D²/λ is a Fresnel number of 1/8: 31.6 mm for 100 µm at 632.8 nm (computed).
  expect((2 * 0.1 ** 2) / 632.8e-6).toBeCloseTo(31.6, 1);
  expect(fresnelNumber(100, 632.8, (2 * 0.1 ** 2) / 632.8e-6)).toBeCloseTo(0.125, 12);
  expect(fresnelNumber(500, 632.8, 500)).toBeCloseTo(0.198, 3);
  expect(fresnelNumber(100, 632.8, 100, 100)).toBeCloseTo(2 * fresnelNumber(100, 632.8, 100), 12);
});

test('refractive index of air', () => {
  // Shop formula at 20 °C, 101.325 kPa, 50 %: 1.000271394; modified Edlén 1.000271375 (computed).
  expect(airRefractiveIndex()).toBeCloseTo(1.000271394, 9);
  expect(Math.abs(airRefractiveIndex() - 1.000271375)).toBeLessThan(1e-7);
  // Sensitivities of modified Edlén: −0.93e-6 per kelvin, 2.68e-6 per kilopascal, −0.85e-8 per percent (computed); the shop
  // formula is within 3e-8 per kelvin of them.
  const change = (air: Partial<typeof STANDARD_AIR>) =>
    airRefractiveIndex({ ...STANDARD_AIR, ...air }) - airRefractiveIndex(STANDARD_AIR);
  expect(Math.abs(change({ temperatureC: 21 }) + 0.93e-6)).toBeLessThan(3e-8);
  expect(Math.abs(change({ pressureKpa: 102.325 }) - 2.68e-6)).toBeLessThan(1e-8);
  expect(Math.abs(change({ humidityPercent: 51 }) + 0.85e-8)).toBeLessThan(1e-9);
  // CIPM Recommendation 2 (2007) gives 632.9908 nm in vacuum (looked up): 632.8191 nm in air (computed).
  expect(wavelengthInAir(HELIUM_NEON_VACUUM.value)).toBeCloseTo(632.8191, 4);
});
