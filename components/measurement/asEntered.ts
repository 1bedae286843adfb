import { formatNumber } from '@/shared/units/format';

/** A number that a person has entered, as it was entered: no rounding beyond eight digits, no zeros that were not there. */
export function asEntered(value: number): string {
  const plain = Number(value.toPrecision(8)).toString();
  const decimals = plain.includes('e') ? 0 : (plain.split('.')[1]?.length ?? 0);
  return formatNumber(value, { places: decimals });
}
