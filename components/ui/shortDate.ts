import { formatDate } from '@/shared/units/format';

/** “6 March” this year, “6 March 2025” in any other. */
export function shortDate(dayOrInstant: string): string {
  const text = formatDate(dayOrInstant);
  const year = ` ${new Date().getFullYear()}`;
  return text.endsWith(year) ? text.slice(0, -year.length) : text;
}
