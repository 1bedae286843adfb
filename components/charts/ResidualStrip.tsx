import { SkiaGate } from '@/components/viewer/SkiaGate';

export interface ResidualPoint {
  id: string;
  label: string;
  order: number;
  x: number;
  /** Distance from the line in `unit`. */
  residual: number;
  leftOut: boolean;
}
export interface ResidualStripProps {
  points: readonly ResidualPoint[];
  /** Largest x among the points: the strip then lies under `CompareChart` on the same scale. */
  xMax: number;
  /** The walls stand at ± this. */
  limit: number;
  unit: string;
  chosenId: string | null;
  onChoose?: (id: string) => void;
  heightPx?: number;
}

const load = () => import('@/components/viewer/drawings').then((m) => m.drawings.residual);

/** Distance of each point from its line, in a slot; what lies beyond is pinned and named. */
export function ResidualStrip(props: ResidualStripProps) {
  return <SkiaGate load={load} componentProps={props} heightPx={props.heightPx ?? 116} />;
}
