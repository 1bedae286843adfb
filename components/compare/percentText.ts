import { formatNumber, NO_VALUE } from '@/shared/units/format';

/** A share as a signed percentage without its sign of unit, `+0.03`; a dash where there is none. */
export function percentText(share: number | null): string {
  if (share === null) return NO_VALUE;
  const text = formatNumber(share * 100, { places: 3 });
  return share > 0 ? `+${text}` : text;
}
