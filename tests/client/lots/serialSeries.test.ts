import { seriesApertures, seriesSchema } from '@/components/lots/seriesForm';
import { serialSeries } from '@/components/lots/serialSeries';

test('the last digits count up and keep their width', () => {
  expect(serialSeries('PO-150-08', 3)).toEqual(['PO-150-08', 'PO-150-09', 'PO-150-10']);
  expect(serialSeries('A99', 2)).toEqual(['A99', 'A100']);
  expect(serialSeries('7-b', 2)).toEqual(['7-b', '8-b']);
});

test('a serial without digits stands for one piece only', () => {
  expect(serialSeries('hole', 1)).toEqual(['hole']);
  expect(serialSeries('hole', 2)).toBeNull();
});

test('the form says in words what is missing', () => {
  const result = seriesSchema.safeParse({ serial: 'hole', count: 8, kind: 'pinhole', nominalSizeUm: null });
  expect(result.success).toBe(false);
  const messages = result.success ? [] : result.error.issues.map((issue) => issue.message);
  expect(messages).toContain('Enter the nominal size in µm as a number.');
});

test('a series needs a serial that can count up', () => {
  const result = seriesSchema.safeParse({ serial: 'hole', count: 8, kind: 'pinhole', nominalSizeUm: 100 });
  expect(result.success ? '' : result.error.issues[0]?.message).toMatch(/^End the first serial in digits/);
});

test('the pieces of a series are alike but for their serials', () => {
  const series = seriesSchema.parse({ serial: 'P-1', count: 2, kind: 'pinhole', nominalSizeUm: 100, toleranceUm: 1 });
  expect(seriesApertures(series)).toEqual([
    { serial: 'P-1', kind: 'pinhole', nominalSizeUm: 100, toleranceUm: 1, note: '' },
    { serial: 'P-2', kind: 'pinhole', nominalSizeUm: 100, toleranceUm: 1, note: '' },
  ]);
});
