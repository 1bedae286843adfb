import { SkiaGate } from '@/components/viewer/SkiaGate';

export interface ArrivingSize {
  /** Place in the capture, from 1. */
  position: number;
  label: string;
  sizeUm: number | null;
  /** Standard uncertainty of what scatters between frames; drawn as a bar. */
  uncertaintyUm: number | null;
  leftOut: boolean;
}
export interface SizesChartProps {
  sizes: readonly ArrivingSize[];
  /** Places that the axis keeps, so that sizes arrive without moving it. */
  total: number;
  meanUm: number | null;
  /** The walls: the mean less and plus its expanded uncertainty. */
  lowUm: number | null;
  highUm: number | null;
  heightPx?: number;
}

const load = () => import('@/components/viewer/drawings').then((m) => m.drawings.sizes);

/** Sizes of a capture in the order of its frames, in the gap of the stated uncertainty. */
export function SizesChart(props: SizesChartProps) {
  return <SkiaGate load={load} componentProps={props} heightPx={props.heightPx ?? 200} />;
}
