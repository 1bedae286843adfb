import type { Ring } from '@/shared/contracts/measureResult';

/** The dark rings by order: what is chosen, plumbed and listed. */
export function darkRings(rings: readonly Ring[]): Ring[] {
  return rings.filter((r) => r.kind === 'dark').sort((a, b) => a.order - b.order);
}

/** The ring nearest to a distance from the centre, px; null when none is within `reachPx`. */
export function ringNear(rings: readonly Ring[], distancePx: number, pxPerMm: number, reachPx: number): number | null {
  let best: number | null = null;
  let least = reachPx;
  for (const ring of rings) {
    const off = Math.abs(ring.radiusMm * pxPerMm - distancePx);
    if (off <= least) {
      least = off;
      best = ring.order;
    }
  }
  return best;
}

/** The next ring outward (+1) or inward (−1); the first or last when none is chosen. */
export function stepRing(rings: readonly Ring[], chosenOrder: number | null, by: 1 | -1): number | null {
  if (rings.length === 0) return null;
  const at = rings.findIndex((r) => r.order === chosenOrder);
  if (at < 0) return (by > 0 ? rings[0] : rings[rings.length - 1])!.order;
  return rings[Math.min(rings.length - 1, Math.max(0, at + by))]!.order;
}
