import { KeyValueList } from '@/components/ui/KeyValueList';
import { formatNumber, formatQuantity } from '@/shared/units/format';
import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';
import { usePointer, type PointerStore } from './pointerStore';
import { readoutAt } from './readout';
import type { MeasuredFrame } from './SheetScene';

interface Props {
  pointer: PointerStore;
  plane: FramePlane | null;
  misfit: MisfitPlane | null;
  measured: MeasuredFrame | null;
}

/** Position, radius, counts, model and misfit under the pointer. */
export function PointerReadout({ pointer, plane, misfit, measured }: Props) {
  const point = usePointer(pointer);
  const r = point && plane ? readoutAt(point, plane, misfit, measured) : null;
  const signed = (v: number) => `${v > 0 ? '+' : ''}${formatNumber(v, { places: 1 })}`;
  const position = r ? `${formatNumber(r.xPx, { places: 1 })}, ${formatQuantity(r.yPx, 'px', { places: 1 })}` : '–';
  const counts = r?.counts ?? null;
  const entries: [string, string][] = [
    ['x, y', position],
    ['Counts', counts === null ? '–' : formatNumber(counts, { places: 0 })],
    ['Above black', r?.aboveBlack === null || !r ? '–' : formatNumber(r.aboveBlack, { places: 0 })],
  ];
  if (measured) {
    const angle = r?.angleDeg ?? null;
    entries.splice(
      1,
      0,
      ['Angle', angle === null ? '–' : `${formatNumber(angle, { places: 1 })}°`],
      ['Radius', formatQuantity(r?.radiusMm, 'mm', { places: 4 })],
    );
    entries.push(['Model', formatNumber(r?.modelCounts, { significant: 3 })]);
    const own = r?.misfit ?? null;
    if (misfit) entries.push(['Misfit', r?.masked ? 'masked' : own === null ? '–' : signed(own)]);
  }
  return <KeyValueList entries={entries} />;
}
