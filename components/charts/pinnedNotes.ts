import type { ResidualPoint } from './ResidualStrip';

export interface PinnedNote {
  x: number;
  high: boolean;
  text: string;
}

/** One sentence for each measurement with points pinned at a wall: how far, and whether every ring says so. */
export function pinnedNotes(points: readonly ResidualPoint[], limit: number, unit: string): PinnedNote[] {
  const byId = new Map<string, ResidualPoint[]>();
  for (const p of points) byId.set(p.id, [...(byId.get(p.id) ?? []), p]);
  const out: PinnedNote[] = [];
  for (const group of byId.values()) {
    const outside = group.filter((p) => Math.abs(p.residual) > 2.2 * limit);
    if (outside.length === 0) continue;
    const mean = outside.reduce((sum, p) => sum + p.residual, 0) / outside.length;
    const high = mean > 0;
    const all = outside.length === group.length && group.length > 1;
    const where = all ? 'on every ring' : `on ring ${outside.map((p) => p.order).join(', ')}`;
    out.push({
      x: group[0]!.x,
      high,
      text: `${group[0]!.label}, ${Math.abs(mean).toFixed(1)} ${unit} ${high ? 'high' : 'low'} ${where}`,
    });
  }
  return out;
}
