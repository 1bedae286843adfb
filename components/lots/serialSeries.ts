/**
 * Serials of several pieces from the first one: its last digits count up and keep their width.
 * “PO-150-08”, 3 → PO-150-08, PO-150-09, PO-150-10. Null where the first serial has no digits to count up.
 */
export function serialSeries(first: string, count: number): string[] | null {
  const serial = first.trim();
  if (count === 1) return [serial];
  const match = /^(.*?)(\d+)(\D*)$/s.exec(serial);
  if (!match) return null;
  const [, head = '', digits = '', tail = ''] = match;
  const start = Number(digits);
  if (!Number.isSafeInteger(start)) return null;
  return Array.from({ length: count }, (_, i) => `${head}${String(start + i).padStart(digits.length, '0')}${tail}`);
}
