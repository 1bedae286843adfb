export type Cell = string | number | null;

/**
 * Comma-separated values (RFC 4180): one header row with the unit in each name, lines ended by CR LF, numbers with a
 * point and every digit they have, what does not exist left empty.
 */
export function toCsv(header: readonly string[], rows: readonly (readonly Cell[])[]): string {
  for (const row of rows) {
    if (row.length !== header.length) throw new Error(`A row has ${row.length} cells under ${header.length} names.`);
  }
  return [header, ...rows].map((row) => `${row.map(quoted).join(',')}\r\n`).join('');
}

function quoted(cell: Cell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : '';
  // A text that begins like a formula is kept from being one when a spreadsheet opens the file.
  const text = /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
