import {
  formatBytes,
  formatDate,
  formatDateTime,
  formatMeasured,
  formatMeasuredText,
  formatNumber,
  formatPercent,
  formatQuantity,
} from '../../../shared/units/format';

describe('formatMeasured', () => {
  // Rule: at most two significant digits of the uncertainty, result rounded to the same place (JCGM 100:2008, 7.2.6,
  // from memory); its examples there are 10.057 62 Ω with 27 mΩ and 28.053 kHz with 0.12 kHz.
  test.each([
    [10.05762, 0.027, '10.058', '0.027'],
    [28.05346, 0.1204, '28.05', '0.12'],
    [100.3712, 0.1089, '100.37', '0.11'],
    [199.95, 0.22, '199.95', '0.22'],
    [1.234, 0.35, '1.23', '0.35'],
    [5, 0.0996, '5.00', '0.10'],
    [5, 0.00996, '5.000', '0.010'],
    [5, 9.96, '5', '10'],
    [1234.4, 12, '1234', '12'],
    [123456, 1234, '123\u202f500', '1200'],
    [-0.0421, 0.0031, '−0.0421', '0.0031'],
    [-0.00001, 0.01, '0.000', '0.010'],
    [0.000123456, 0.0000021, '0.0001235', '0.0000021'],
  ])('%d ± %d', (value, uncertainty, valueText, uncertaintyText) => {
    expect(formatMeasured(value, uncertainty)).toEqual({ value: valueText, uncertainty: uncertaintyText });
  });

  test.each([null, undefined, NaN, 0, -1, Infinity])('invents no uncertainty for %s', (uncertainty) => {
    expect(formatMeasured(201.3712, uncertainty)).toEqual({ value: '201.37', uncertainty: null });
  });

  test.each([null, undefined, NaN, Infinity])('shows that there is no value for %s', (value) => {
    expect(formatMeasured(value, 1)).toEqual({ value: '–', uncertainty: null });
    expect(formatMeasuredText(value, 1, 'µm')).toBe('–');
  });

  test('with its unit', () => {
    expect(formatMeasuredText(100.3712, 0.1089, 'µm')).toBe('100.37 ± 0.11\u202fµm');
    expect(formatMeasuredText(100.3712, null, 'µm')).toBe('100.37\u202fµm');
  });
});

test.each([
  [632.8, undefined, '632.8'],
  [0, undefined, '0'],
  [-3, { places: 1 }, '−3.0'],
  [-0.04, { places: 1 }, '0.0'],
  [0.99996, { significant: 4 }, '1.000'],
  [9999, undefined, '9999'],
  [10000, { places: 0 }, '10\u202f000'],
  [1234567.891, { places: 2 }, '1\u202f234\u202f567.89'],
  [1234567, { significant: 3 }, '1\u202f230\u202f000'],
  [null, undefined, '–'],
])('formatNumber(%s, %s)', (value, digits, text) => {
  expect(formatNumber(value, digits)).toBe(text);
});

test('quantities, percentages and file sizes', () => {
  expect(formatQuantity(500, 'mm', { places: 2 })).toBe('500.00\u202fmm');
  expect(formatQuantity(null, 'mm')).toBe('–');
  expect(formatPercent(0.0312)).toBe('3.1\u202f%');
  expect(formatPercent(0.8542, { places: 0 })).toBe('85\u202f%');
  expect(formatPercent(null)).toBe('–');
  expect(formatBytes(0)).toBe('0\u202fB');
  expect(formatBytes(2621728)).toBe('2.6\u202fMB');
  expect(formatBytes(999_960)).toBe('1.0\u202fMB');
  expect(formatBytes(25_000_000)).toBe('25\u202fMB');
});

test('days and points in time', () => {
  expect(formatDate('2026-03-04')).toBe('4 March 2026');
  const local = new Date(2026, 2, 4, 7, 26).toISOString();
  expect(formatDate(local)).toBe('4 March 2026');
  expect(formatDateTime(local)).toBe('4 March 2026, 07:26');
  expect(formatDateTime('never')).toBe('–');
  expect(formatDate(null)).toBe('–');
});
