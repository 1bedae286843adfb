export type SortKey = string | number | null;

const words = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** A sorted copy: numbers by size, texts as people read them (P-2 before P-10), nothing last in either order. */
export function sortedBy<R>(rows: readonly R[], key: (row: R) => SortKey, descending = false): R[] {
  const sign = descending ? -1 : 1;
  return [...rows].sort((left, right) => {
    const a = key(left);
    const b = key(right);
    if (a === null || b === null) return a === b ? 0 : a === null ? 1 : -1;
    if (typeof a === 'number' && typeof b === 'number') return sign * (a - b);
    return sign * words.compare(String(a), String(b));
  });
}
