import { SkiaGate } from '@/components/viewer/SkiaGate';
import type { RadialProfile, Ring } from '@/shared/contracts/measureResult';

export interface ProfileChartProps {
  profile: RadialProfile;
  /** All rings; the dark ones are plumbed and can be chosen. */
  rings: readonly Ring[];
  chosenOrder: number | null;
  onChooseRing?: (order: number | null) => void;
  heightPx?: number;
  /** Draws the slot of the misfit under the profile. */
  misfit?: boolean;
}

const load = () => import('@/components/viewer/drawings').then((m) => m.drawings.profile);

/** Radial profile on log counts over its misfit: measured dots, model line, a plumb for each dark ring. */
export function ProfileChart(props: ProfileChartProps) {
  return <SkiaGate load={load} componentProps={props} heightPx={props.heightPx ?? 270} />;
}
