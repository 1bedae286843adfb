export type Cell = string | number | null;

/** A column: its name, which never changes, and the unit of what stands in it; null for words and bare numbers. */
export type Column = readonly [name: string, unit: string | null];

/**
 * Comma-separated values (RFC 4180) under two header rows, names and units; lines ended by CR LF, numbers with a
 * point and every digit they have, what does not exist left empty.
 */
export function toCsv(columns: readonly Column[], rows: readonly (readonly Cell[])[]): string {
  for (const row of rows) {
    if (row.length !== columns.length) throw new Error(`A row has ${row.length} cells under ${columns.length} names.`);
  }
  const header: Cell[][] = [columns.map(([name]) => name), columns.map(([, unit]) => unit)];
  return [...header, ...rows].map((row) => `${row.map(quoted).join(',')}\r\n`).join('');
}

function quoted(cell: Cell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : '';
  // A text that begins like a formula is kept from being one when a spreadsheet opens the file.
  const text = /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
