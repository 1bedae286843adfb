import { readAperture } from '@/components/lots/apertureReading';
import { countOfKind, nominalText } from '@/components/lots/apertureWords';

const measured = (sizeUm: number | null) => ({
  measurementId: '00000000-0000-4000-8000-000000000000',
  state: 'measured' as const,
  sizeUm,
  expandedUncertaintyUm: 0.11,
  reason: null,
});

test.each([
  [100.37, 'conforms', 'within limits', false],
  [100.94, 'undecided', 'at a limit', true],
  [101.42, 'above', 'over the limit', true],
  [98.2, 'below', 'under the limit', true],
])('%d ± 0.11 µm in 100 ± 1 µm', (sizeUm, verdict, words, toLookAt) => {
  const reading = readAperture({ nominalSizeUm: 100, toleranceUm: 1, newest: measured(sizeUm) });
  expect(reading).toEqual({ stage: 'measured', verdict, words, toLookAt });
});

test('without a tolerance nothing is judged', () => {
  expect(readAperture({ nominalSizeUm: 100, toleranceUm: null, newest: measured(180) }).verdict).toBe('open');
});

test('a refusal is named and asks for a person', () => {
  const newest = { ...measured(null), state: 'refused' as const, expandedUncertaintyUm: null, reason: 'two-patterns' };
  expect(readAperture({ nominalSizeUm: 100, toleranceUm: 1, newest })).toMatchObject({
    stage: 'refused',
    words: 'refused: two patterns',
    toLookAt: true,
  });
});

test('a piece not yet on the bench waits', () => {
  expect(readAperture({ nominalSizeUm: 100, toleranceUm: 1, newest: null }).stage).toBe('waiting');
});

test('nominal size and tolerance end on the same place', () => {
  expect(nominalText(100, 1)).toBe('100 ± 1\u202fµm');
  expect(nominalText(100, 0.5)).toBe('100.0 ± 0.5\u202fµm');
  expect(nominalText(12.5, null)).toBe('12.5\u202fµm');
});

test('pieces are counted by their kind', () => {
  expect(countOfKind(['pinhole', 'pinhole'])).toBe('2 pinholes');
  expect(countOfKind(['slit'])).toBe('1 slit');
  expect(countOfKind(['slit', 'wire'])).toBe('2 apertures');
  expect(countOfKind([])).toBe('0 apertures');
});
