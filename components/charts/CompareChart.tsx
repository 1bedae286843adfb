import { SkiaGate } from '@/components/viewer/SkiaGate';

export interface ComparePoint {
  /** The measurement. */
  id: string;
  label: string;
  /** Order of the dark ring. */
  order: number;
  x: number;
  /** Standard uncertainties, drawn as bars. */
  xUncertainty: number;
  y: number;
  yUncertainty: number;
  leftOut: boolean;
}
export interface CompareLine {
  order: number;
  intercept: number;
  slope: number;
}
export interface CompareChartProps {
  lines: readonly CompareLine[];
  points: readonly ComparePoint[];
  /** Marks across, in the units of x, with what they say. */
  xTicks: readonly { x: number; label: string }[];
  xTitle: string;
  yTitle: string;
  /** Edge of the sensor: above it nothing can be seen. */
  edgeY: number | null;
  edgeLabel?: string;
  chosenId: string | null;
  onChoose?: (id: string) => void;
  heightPx?: number;
}

const load = () => import('@/components/viewer/drawings').then((m) => m.drawings.compare);

/** Ring radii against what was varied, with a straight line for each order. */
export function CompareChart(props: CompareChartProps) {
  return <SkiaGate load={load} componentProps={props} heightPx={props.heightPx ?? 560} />;
}
