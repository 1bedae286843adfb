import { edgeDerivative, edgeFringeScaleUm, edgeIrradiance } from '../../../shared/optics/edge';
import { fresnelIntegrals } from '../../../shared/optics/fresnelIntegrals';
import { SLIT_BRIGHT_BETA, slitDerivative, slitIntensity } from '../../../shared/optics/slit';

describe('slit (Born & Wolf 8.5.1, table 8.1, from memory; computed)', () => {
  test('secondary maxima', () => {
    [0.0471904492, 0.016480026, 0.0083402927, 0.0050287187, 0.0033607299].forEach((height, index) => {
      expect(slitIntensity(SLIT_BRIGHT_BETA[index])).toBeCloseTo(height, 9);
      expect(Math.abs(slitDerivative(SLIT_BRIGHT_BETA[index]))).toBeLessThan(1e-8);
    });
    expect(SLIT_BRIGHT_BETA.map((beta) => (beta / Math.PI).toFixed(8))).toEqual([
      '1.43029665',
      '2.45902403',
      '3.47088972',
      '4.47740858',
      '5.48153665',
    ]);
  });

  test('minima at whole multiples of π and half height at 1.391557378', () => {
    for (let order = 1; order < 8; order += 1) expect(slitIntensity(order * Math.PI)).toBeLessThan(1e-30);
    expect(slitIntensity(1.391557378)).toBeCloseTo(0.5, 9);
    expect(slitIntensity(0)).toBe(1);
  });

  test('energy between the minima', () => {
    const step = Math.PI / 2000;
    [0.9028233336, 0.9499393398, 0.966410435].forEach((part, index) => {
      let sum = 0;
      for (let at = 0; at < 2000 * (index + 1); at += 1) sum += slitIntensity((at + 0.5) * step) * step;
      // The whole is ∫ (sin β/β)² dβ = π.
      expect((2 * sum) / Math.PI).toBeCloseTo(part, 6);
    });
  });

  test('its derivative is that of the intensity', () => {
    for (const beta of [-3, 0, 0.0099, 0.0101, 2, 20]) {
      const slope = (slitIntensity(beta + 1e-4) - slitIntensity(beta - 1e-4)) / 2e-4;
      expect(Math.abs(slitDerivative(beta) - slope)).toBeLessThan(1e-8);
    }
  });
});

describe('Fresnel integrals (computed; at 1 A&S table 7.7 gives 0.7798934 and 0.4382591, from memory)', () => {
  test.each([
    [0.5, 0.4923442259, 0.0647324329],
    [1, 0.7798934004, 0.4382591474],
    [1.5, 0.445261176, 0.6975049601],
    [2, 0.4882534061, 0.3434156784],
    [3, 0.6057207893, 0.496312999],
    [5, 0.5636311887, 0.4991913819],
  ])('at %d', (w, c, s) => {
    expect(fresnelIntegrals(w).c).toBeCloseTo(c, 9);
    expect(fresnelIntegrals(w).s).toBeCloseTo(s, 9);
    expect(fresnelIntegrals(-w)).toEqual({ c: -fresnelIntegrals(w).c, s: -fresnelIntegrals(w).s });
  });

  test('the series and the fraction meet, and both end at a half', () => {
    const below = fresnelIntegrals(1.9 - 1e-13);
    const above = fresnelIntegrals(1.9 + 1e-13);
    expect(Math.abs(below.c - above.c)).toBeLessThan(1e-12);
    expect(Math.abs(below.s - above.s)).toBeLessThan(1e-12);
    // C(w) = ½ + sin(πw²/2)/πw − …, S(w) = ½ − cos(πw²/2)/πw − … (DLMF 7.12, looked up).
    const w = 1001.3;
    const angle = (Math.PI / 2) * w * w;
    expect(fresnelIntegrals(w).c).toBeCloseTo(0.5 + Math.sin(angle) / (Math.PI * w), 9);
    expect(fresnelIntegrals(w).s).toBeCloseTo(0.5 - Math.cos(angle) / (Math.PI * w), 9);
    expect(fresnelIntegrals(1e9)).toEqual({ c: 0.5, s: 0.5 });
    expect(fresnelIntegrals(0)).toEqual({ c: 0, s: 0 });
  });
});

describe('straight edge (Kielkopf, looked up; Born & Wolf 8.7.3, from memory; values computed)', () => {
  test.each([
    [1.217198251, 1.37044292, 216.511],
    [1.872519062, 0.778251047, 333.077],
    [2.344485382, 1.199271203, 417.029],
    [2.739008081, 0.843161897, 487.205],
    [3.081958235, 1.150880559, 548.208],
    [3.391335508, 0.871941695, 603.238],
    [3.674110477, 1.126059509, 653.537],
    [3.937098267, 0.889063885, 700.317],
    [4.183226024, 1.110392987, 744.097],
  ])('extremum at w = %d', (w, irradiance, placeUm) => {
    expect(edgeIrradiance(w)).toBeCloseTo(irradiance, 8);
    expect(Math.abs(edgeDerivative(w))).toBeLessThan(5e-8);
    expect(w * edgeFringeScaleUm(632.8, 100)).toBeCloseTo(placeUm, 3);
  });

  test.each([
    [0, 0.25],
    [0.778021695, 1],
    [-3, 0.00559524],
    [-2, 0.012328316],
    [-1, 0.041076124],
    [-0.5, 0.094758233],
    [0.5, 0.651834892],
    [1, 1.259228672],
    [2, 0.843997401],
    [3, 1.107629028],
  ])('irradiance at w = %d', (w, irradiance) => expect(edgeIrradiance(w)).toBeCloseTo(irradiance, 8));

  test('a near source spreads the fringes by the root of (z + R)/R', () => {
    expect(edgeFringeScaleUm(632.8, 250, 300) / edgeFringeScaleUm(632.8, 250)).toBeCloseTo(Math.sqrt(550 / 300), 12);
  });

  // On the axis of a slit of Fresnel number N: 2[C²(√2N) + S²(√2N)] (computed).
  test.each([
    [0.1, 0.39650398],
    [0.25, 0.94644158],
    [0.5, 1.60060959],
    [1, 1.57896528],
    [2, 0.71265143],
  ])('slit on the axis at N = %d', (n, value) => {
    const { c, s } = fresnelIntegrals(Math.sqrt(2 * n));
    expect(2 * (c * c + s * s)).toBeCloseTo(value, 8);
  });
});
