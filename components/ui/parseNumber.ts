/**
 * Reads a number as people type it: point or comma for decimals, spaces between thousands, a true minus, 1e-3.
 * Empty text is null; what is no number is NaN.
 */
export function parseNumber(text: string): number | null {
  const plain = text
    .replace(/[\s\u2009\u00a0\u202f]/g, '')
    .replace('\u2212', '-')
    .replace(',', '.');
  if (plain === '') return null;
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain) ? Number(plain) : Number.NaN;
}

/** Text of a number for editing: no rounding beyond what binary fractions add. */
export function editableNumber(value: number | null | undefined): string {
  if (value === null || value === undefined || Number.isNaN(value)) return '';
  return String(Number(value.toPrecision(12)));
}
