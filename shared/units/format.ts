/** Narrow no-break space: between digits in groups of three and before a unit. */
export const THIN_SPACE = '\u202f';
/** What stands where a number does not exist. */
export const NO_VALUE = '–';

const MINUS = '−';
const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** Digits in front of the point in groups of three from five digits on (SI Brochure 5.4.4), with a true minus. */
function withGroups(plain: string): string {
  const negative = plain.startsWith('-');
  const [whole = '', decimals] = (negative ? plain.slice(1) : plain).split('.');
  const grouped = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
  const text = decimals === undefined ? grouped : `${grouped}.${decimals}`;
  return negative && /[1-9]/.test(text) ? MINUS + text : text;
}

/** A finite number written to `places` decimals; negative places round to tens, hundreds and so on. */
function toPlaces(value: number, places: number): string {
  if (places >= 0) return withGroups(value.toFixed(Math.min(places, 20)));
  const step = 10 ** -places;
  return withGroups((Math.round(value / step) * step).toFixed(0));
}

/** Decimal places that leave `significant` digits of `value`, after rounding (0.0996 has two in 0.10). */
function placesOf(value: number, significant: number): number {
  return (
    significant -
    1 -
    Number(
      Math.abs(value)
        .toExponential(significant - 1)
        .split('e')[1],
    )
  );
}

/** A number with a fixed count of decimals or of significant digits (default: 4 significant). */
export function formatNumber(
  value: number | null | undefined,
  digits: { places: number } | { significant: number } = { significant: 4 },
): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return NO_VALUE;
  if ('places' in digits) return toPlaces(value, digits.places);
  return toPlaces(value, value === 0 ? 0 : placesOf(value, digits.significant));
}

export interface MeasuredText {
  /** Ends on the same decimal place as the uncertainty. */
  value: string;
  /** Two significant digits; null when no uncertainty is known. */
  uncertainty: string | null;
}

/**
 * Value and uncertainty of a measured quantity in the same unit, the uncertainty with two significant digits
 * and both ending on the same place (JCGM 100:2008, 7.2.6). Without an uncertainty the value has five
 * significant digits and none is invented.
 */
export function formatMeasured(value: number | null | undefined, uncertainty: number | null | undefined): MeasuredText {
  if (value === null || value === undefined || !Number.isFinite(value)) return { value: NO_VALUE, uncertainty: null };
  if (uncertainty === null || uncertainty === undefined || !Number.isFinite(uncertainty) || uncertainty <= 0)
    return { value: formatNumber(value, { significant: 5 }), uncertainty: null };
  const places = placesOf(uncertainty, 2);
  return { value: toPlaces(value, places), uncertainty: toPlaces(uncertainty, places) };
}

/** `100.37 ± 0.11 µm`, or the value with its unit alone when no uncertainty is known. */
export function formatMeasuredText(
  value: number | null | undefined,
  uncertainty: number | null | undefined,
  unit: string,
): string {
  const text = formatMeasured(value, uncertainty);
  if (text.value === NO_VALUE) return NO_VALUE;
  return (text.uncertainty === null ? text.value : `${text.value} ± ${text.uncertainty}`) + THIN_SPACE + unit;
}

/** A number with its unit. */
export function formatQuantity(
  value: number | null | undefined,
  unit: string,
  digits?: { places: number } | { significant: number },
): string {
  const text = formatNumber(value, digits);
  return text === NO_VALUE ? text : text + THIN_SPACE + unit;
}

/** A fraction of one as a percentage, `0.031` as `3.1 %`. */
export function formatPercent(
  fraction: number | null | undefined,
  digits: { places: number } | { significant: number } = { significant: 2 },
): string {
  return formatQuantity(fraction === null || fraction === undefined ? fraction : fraction * 100, '%', digits);
}

/** Size of a file in decimal units, `2.6 MB`. */
export function formatBytes(byteSize: number | null | undefined): string {
  if (byteSize === null || byteSize === undefined || !Number.isFinite(byteSize)) return NO_VALUE;
  if (byteSize < 1000) return formatQuantity(byteSize, 'B', { places: 0 });
  const units = ['kB', 'MB', 'GB', 'TB'];
  let scaled = byteSize / 1000;
  let index = 0;
  while (scaled >= 999.5 && index < units.length - 1) {
    scaled /= 1000;
    index += 1;
  }
  return formatQuantity(scaled, units[index] ?? 'TB', { places: scaled < 9.95 ? 1 : 0 });
}

/** A day (`2026-03-04`) or a point in time, in the reader's own time zone, as `4 March 2026`. */
export function formatDate(instant: string | null | undefined): string {
  const day = /^(\d{4})-(\d{2})-(\d{2})$/.exec(instant ?? '');
  const date = day ? new Date(Number(day[1]), Number(day[2]) - 1, Number(day[3])) : new Date(instant ?? NaN);
  if (Number.isNaN(date.getTime())) return NO_VALUE;
  return `${date.getDate()} ${MONTHS[date.getMonth()] ?? ''} ${date.getFullYear()}`;
}

/** A point in time in the reader's own time zone, `07:26`. */
export function formatTime(instant: string | null | undefined): string {
  const date = new Date(instant ?? NaN);
  if (Number.isNaN(date.getTime())) return NO_VALUE;
  return `${String(date.getHours()).padStart(2, '0')}:${String(date.getMinutes()).padStart(2, '0')}`;
}

/** A point in time in the reader's own time zone, `4 March 2026, 07:26`. */
export function formatDateTime(instant: string | null | undefined): string {
  const date = formatDate(instant);
  return date === NO_VALUE ? date : `${date}, ${formatTime(instant)}`;
}
