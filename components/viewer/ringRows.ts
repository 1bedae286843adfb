import type { Ring } from '@/shared/contracts/measureResult';

/** Least distance between two rows of the table, px. */
export const ROW_GAP_PX = 32;

/**
 * Middle of the table row of each dark ring, px on the sheet: at the height where the ring stands over the centre, moved
 * apart where rings lie close, and kept between `top` and `foot`.
 */
export function ringRows(
  dark: readonly Ring[],
  centreY: number,
  pxPerMm: number,
  top: number,
  foot: number,
): Map<number, number> {
  const rows = dark
    .map((ring) => ({ order: ring.order, y: Math.min(foot, Math.max(top, centreY - ring.radiusMm * pxPerMm)) }))
    .sort((a, b) => b.order - a.order);
  const gap = Math.min(ROW_GAP_PX, rows.length > 1 ? (foot - top) / (rows.length - 1) : ROW_GAP_PX);
  for (let i = 1; i < rows.length; i += 1) rows[i]!.y = Math.max(rows[i]!.y, rows[i - 1]!.y + gap);
  for (let i = rows.length - 1; i >= 0; i -= 1) {
    const limit = i === rows.length - 1 ? foot : rows[i + 1]!.y - gap;
    rows[i]!.y = Math.min(rows[i]!.y, limit);
  }
  return new Map(rows.map((r) => [r.order, r.y]));
}
