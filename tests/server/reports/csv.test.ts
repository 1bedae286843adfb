import type { MeasurementDetail } from '../../../shared/contracts/measurements';
import { csvFileName } from '../../../shared/units/csvFileName';
import { lineProfileCsv } from '../../../server/reports/lineProfileCsv';
import { radialProfileCsv } from '../../../server/reports/radialProfileCsv';
import { ringTableCsv } from '../../../server/reports/ringTableCsv';
import { toCsv } from '../../../server/reports/toCsv';
import { measuredResult } from '../support/fillLaboratory';

test('cells that hold separators, quotes or line ends are quoted (RFC 4180, section 2)', () => {
  const text = toCsv(
    [
      ['a', 'mm'],
      ['b', null],
    ],
    [
      ['x,y', 'say "no"'],
      ['two\r\nlines', null],
    ],
  );
  expect(text).toBe('a,b\r\nmm,\r\n"x,y","say ""no"""\r\n"two\r\nlines",\r\n');
});

test('numbers keep every digit; what is no number is left empty', () => {
  expect(toCsv([['n', 'mm']], [[0.1 + 0.2], [-1.5e-9], [NaN], [Infinity]])).toBe(
    'n\r\nmm\r\n0.30000000000000004\r\n-1.5e-9\r\n\r\n\r\n',
  );
});

test('a text cannot become a formula', () => {
  expect(toCsv([['t', null]], [['=1+1'], ['-x']])).toBe("t\r\n\r\n'=1+1\r\n'-x\r\n");
});

test('a row that does not fit its header is a mistake', () => {
  expect(() => toCsv([['a', null]], [[1, 2]])).toThrow('2 cells under 1 names');
});

test('a radial profile has its units and standard errors in columns', () => {
  const profile = { radiusMm: [0.1], meanCounts: [20], standardErrorCounts: [0.5], pixelCount: [6], modelCounts: [21] };
  expect(radialProfileCsv(profile)).toBe(
    'radius_mm,mean_counts,standard_error_counts,pixel_count,model_counts\r\nmm,counts,counts,,counts\r\n0.1,20,0.5,6,21\r\n',
  );
});

test('a ring table has one row a ring; a run without a size has none', () => {
  const header =
    'order,kind,radius_mm,radius_standard_uncertainty_mm,predicted_radius_mm,size_um,size_standard_uncertainty_um\r\n' +
    ',,mm,mm,mm,um,um\r\n';
  const inputs = { distanceMm: 500 } as MeasurementDetail['inputs'];
  const [names, units, ring] = ringTableCsv({ result: measuredResult('x'), inputs }).split(/(?<=\r\n)/);
  expect(`${names}${units}`).toBe(header);
  expect(ring).toMatch(/^1,dark,1\.9301,0\.0004,1\.9301,199\.95,0\.0414/);
  expect(ringTableCsv({ result: null, inputs })).toBe(header);
});

test('a line profile has millimetres where the pitch is known', () => {
  const profile = {
    distancePx: [0, 2],
    xPx: [1, 3],
    yPx: [0, 0],
    meanCounts: [5, null],
    standardErrorCounts: [null, null],
  };
  expect(lineProfileCsv(profile, null)).toBe(
    'distance_px,x_px,y_px,mean_counts,standard_error_counts\r\npx,px,px,counts,counts\r\n0,1,0,5,\r\n2,3,0,,\r\n',
  );
  expect(lineProfileCsv(profile, 5)).toContain('distance_px,distance_mm,x_px');
  expect(lineProfileCsv(profile, 5)).toContain('\r\n2,0.01,3,0,,\r\n');
});

test('the name of a file is safe on every file system', () => {
  const detail = { lotNumber: 'L/7: a', apertureSerial: '../Ø 3', id: 'abcdef0123' } as MeasurementDetail;
  expect(csvFileName(detail, 'rings')).toBe('L_7_a-.._Ø_3-rings-abcdef01.csv');
});
