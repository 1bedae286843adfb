import besselj1 from '@stdlib/math-base-special-besselj1';
import { slopeSays } from '@/components/compare/benchSays';
import { compareLine } from '@/components/compare/compareLine';
import { darkRingFactor } from '@/components/compare/darkRingFactor';
import { percentText } from '@/components/compare/percentText';
import { residualLimit } from '@/components/compare/residualLimit';
import type { Compared } from '@/shared/contracts/measurements';

const WAVELENGTH_NM = 632.8;
const DISTANCE_MM = 500;

/** A piece whose rings lie exactly where the far field of a hole of `sizeUm` puts them, with exact angles. */
function piece(n: number, sizeUm: number, change: Partial<Compared> = {}): Compared {
  return {
    measurementId: `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`,
    apertureSerial: `PO-${n}`,
    lotNumber: 'L-0417',
    benchName: 'Bench 2',
    nominalSizeUm: sizeUm,
    sizeUm,
    standardUncertaintyUm: sizeUm * 5e-4,
    fitUncertaintyUm: sizeUm * 1e-5,
    wavelengthNm: WAVELENGTH_NM,
    distanceMm: DISTANCE_MM,
    rings: [1, 2, 3].map((order) => ({
      order,
      kind: 'dark' as const,
      radiusMm: DISTANCE_MM * Math.tan(Math.asin((darkRingFactor(order) * WAVELENGTH_NM) / 1000 / sizeUm)),
      uncertaintyMm: 2e-4,
      predictedMm: 1,
      sizeUm,
    })),
    measuredAt: '2026-03-04T07:00:00.000Z',
    ...change,
  };
}

describe('darkRingFactor', () => {
  // Zeros of J1: Abramowitz & Stegun, table 9.5 (from memory).
  it('gives the zeros of J1', () => {
    expect(darkRingFactor(1) * Math.PI).toBeCloseTo(3.83170597, 7);
    expect(darkRingFactor(2) * Math.PI).toBeCloseTo(7.01558667, 7);
    expect(darkRingFactor(10) * Math.PI).toBeCloseTo(32.189679911, 8);
  });

  it('goes on beyond the table where J1 vanishes', () => {
    for (const order of [11, 15, 30]) expect(Math.abs(besselj1(darkRingFactor(order) * Math.PI))).toBeLessThan(1e-9);
  });
});

describe('compareLine', () => {
  const series = [50, 100, 150, 200, 300].map((sizeUm, i) => piece(i + 1, sizeUm));

  it.each(['nominal', 'measured'] as const)('gives back λz from exact rings, by the %s size', (basis) => {
    const line = compareLine(series, basis);
    expect(line.fit?.slope).toBeCloseTo((WAVELENGTH_NM / 1000) * DISTANCE_MM, 6);
    expect(line.fit?.intercept).toBeCloseTo(0, 9);
    expect(line).toMatchObject({ outliers: [], strangers: [], ringless: [], usedCount: 5, reason: null });
    expect(slopeSays(line, series)?.distanceMm).toBeCloseTo(DISTANCE_MM, 5);
  });

  it('finds the piece that is off, leaves it out and keeps the line', () => {
    const wrong = piece(9, 150, { nominalSizeUm: 151.65 });
    const line = compareLine([...series, wrong], 'nominal');
    expect(line.outliers).toEqual([
      { measurementId: wrong.measurementId, serial: 'PO-9', offset: expect.closeTo(0.011, 4), ringCount: 3 },
    ]);
    expect(line.points.filter((point) => point.leftOut)).toHaveLength(3);
    expect(line.points.find((point) => point.leftOut)?.residual).toBeCloseTo(0.011, 4);
    expect(line.fit?.slope).toBeCloseTo(316.4, 6);
  });

  it('says of a wrong distance how far it is off', () => {
    const bench = series.map((one) => ({ ...one, distanceMm: 501 }));
    const says = slopeSays(compareLine(bench, 'nominal'), bench);
    expect(says?.benchDistanceMm).toBe(501);
    expect(says?.distanceMm).toBeCloseTo(500, 1);
  });

  it('draws no line through fewer than three, nor through one size', () => {
    expect(compareLine(series.slice(0, 2), 'nominal')).toMatchObject({ fit: null, reason: 'too-few', usedCount: 2 });
    const same = [1, 2, 3].map((n) => piece(n, 100));
    expect(compareLine(same, 'nominal')).toMatchObject({ fit: null, reason: 'one-size' });
    expect(compareLine([], 'nominal')).toMatchObject({ points: [], fit: null, reason: 'too-few' });
  });

  it('keeps pieces of another bench constant, and pieces without rings, off the line', () => {
    const other = piece(7, 100, { wavelengthNm: 532 });
    const bare = piece(8, 25, { rings: [] });
    const line = compareLine([...series, other, bare], 'nominal');
    expect(line.strangers).toEqual([{ measurementId: other.measurementId, serial: 'PO-7' }]);
    expect(line.ringless).toEqual([{ measurementId: bare.measurementId, serial: 'PO-8' }]);
    expect(line.fit?.slope).toBeCloseTo(316.4, 6);
  });
});

describe('numbers of the comparison', () => {
  it('puts the walls of the residual strip at a round number beyond the points', () => {
    expect(residualLimit([0.03, -0.11])).toBe(0.2);
    expect(residualLimit([])).toBe(0.01);
    expect(residualLimit([40])).toBe(10);
  });

  it('writes shares with their sign', () => {
    expect(percentText(0.0003)).toBe('+0.030');
    expect(percentText(-0.011)).toBe('−1.100');
    expect(percentText(null)).toBe('–');
  });
});
