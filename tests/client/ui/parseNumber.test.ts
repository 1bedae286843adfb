import { editableNumber, parseNumber } from '@/components/ui/parseNumber';
import { sortedBy } from '@/components/ui/sortedBy';

test.each([
  ['632.8', 632.8],
  ['632,8', 632.8],
  [' 1 200 ', 1200],
  ['\u22120.5', -0.5],
  ['1e-3', 0.001],
  ['.5', 0.5],
  ['100.', 100],
])('%p is read as %p', (text, value) => {
  expect(parseNumber(text)).toBe(value);
});

test.each(['12a', '1.2.3', '1,2,3', '--5', 'e5', '.', '0x10', 'Infinity'])('%p is no number', (text) => {
  expect(parseNumber(text)).toBeNaN();
});

test('nothing typed is null, not zero', () => {
  expect(parseNumber('')).toBeNull();
  expect(parseNumber('  ')).toBeNull();
});

test('a number for editing has no tail of binary fractions and comes back as it was', () => {
  expect(editableNumber(0.1 + 0.2)).toBe('0.3');
  expect(editableNumber(null)).toBe('');
  expect(editableNumber(Number.NaN)).toBe('');
  expect(parseNumber(editableNumber(632.8164))).toBe(632.8164);
});

test('tables sort serials as people read them and put nothing last either way', () => {
  const rows = [{ k: 'P-10' }, { k: 'P-2' }, { k: null }, { k: 'P-1' }];
  expect(sortedBy(rows, (row) => row.k).map((row) => row.k)).toEqual(['P-1', 'P-2', 'P-10', null]);
  expect(sortedBy(rows, (row) => row.k, true).map((row) => row.k)).toEqual(['P-10', 'P-2', 'P-1', null]);
  expect(sortedBy([{ k: 10 }, { k: 9 }], (row) => row.k).map((row) => row.k)).toEqual([9, 10]);
});
