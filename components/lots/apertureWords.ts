import { shortDate } from '@/components/ui/shortDate';
import type { ApertureKind } from '@/shared/contracts/lots';
import { formatMeasuredText, formatNumber, THIN_SPACE } from '@/shared/units/format';

export const kindChoices: readonly { value: ApertureKind; label: string }[] = [
  { value: 'pinhole', label: 'Pinhole' },
  { value: 'slit', label: 'Slit' },
  { value: 'wire', label: 'Wire' },
  { value: 'edge', label: 'Edge' },
  { value: 'beam', label: 'Beam' },
];

/** “12 pinholes”, “1 slit”, “8 apertures” where the kinds differ. */
export function countOfKind(kinds: readonly ApertureKind[]): string {
  const first = kinds[0];
  const word = first !== undefined && kinds.every((kind) => kind === first) ? first : 'aperture';
  return `${kinds.length} ${word}${kinds.length === 1 ? '' : 's'}`;
}

/** “100 ± 1 µm”, “100 µm” without a tolerance. */
export function nominalText(nominalSizeUm: number, toleranceUm: number | null): string {
  const size = formatNumber(nominalSizeUm, { places: placesOf(nominalSizeUm, toleranceUm) });
  if (toleranceUm === null) return `${size}${THIN_SPACE}µm`;
  return `${size} ± ${formatNumber(toleranceUm, { places: placesOf(nominalSizeUm, toleranceUm) })}${THIN_SPACE}µm`;
}

function placesOf(nominal: number, tolerance: number | null): number {
  const shown = (value: number) => (String(Number(value.toPrecision(6))).split('.')[1] ?? '').length;
  return Math.max(shown(nominal), tolerance === null ? 0 : shown(tolerance));
}

/** Size and expanded uncertainty of the newest measurement, for those who hear it. */
export function sizeSentence(
  serial: string,
  sizeUm: number | null,
  expandedUncertaintyUm: number | null,
  words: string,
): string {
  return sizeUm === null
    ? `${serial}, ${words}`
    : `${serial}, ${formatMeasuredText(sizeUm, expandedUncertaintyUm, 'µm')}, ${words}`;
}

/** “due 6 March”, “no due date”. */
export function dueWords(dueOn: string | null): string {
  return dueOn === null ? 'no due date' : `due ${shortDate(dueOn)}`;
}
