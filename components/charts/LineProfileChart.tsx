import { SkiaGate } from '@/components/viewer/SkiaGate';
import type { LineProfile } from '@/shared/contracts/lineProfile';

export interface LineProfileChartProps {
  line: LineProfile;
  /** Null: distance in pixels. */
  pixelPitchUm: number | null;
  blackCount: number;
  heightPx?: number;
}

const load = () => import('@/components/viewer/drawings').then((m) => m.drawings.line);

/** Counts above black along a line over the frame. */
export function LineProfileChart(props: LineProfileChartProps) {
  return <SkiaGate load={load} componentProps={props} heightPx={props.heightPx ?? 196} />;
}
