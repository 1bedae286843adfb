import { Table, type Column } from '@/components/ui/Table';
import { Section } from '@/components/ui/Section';
import { formatMeasured, formatNumber } from '@/shared/units/format';
import { percentText } from './percentText';
import type { RingPoint } from './compareLine';

const columns: readonly Column<RingPoint>[] = [
  { key: 'piece', title: 'Piece', cell: (p) => p.serial, sortBy: (p) => p.serial },
  { key: 'order', title: 'Dark ring', width: 72, align: 'right', cell: (p) => p.order, sortBy: (p) => p.order },
  {
    key: 'size',
    title: 'Size, µm',
    width: 80,
    align: 'right',
    cell: (p) => formatNumber(1 / p.x, { significant: 5 }),
    sortBy: (p) => 1 / p.x,
  },
  {
    key: 'radius',
    title: 'z sin θ, mm',
    width: 84,
    align: 'right',
    cell: (p) => formatMeasured(p.y, p.yUncertainty).value,
    sortBy: (p) => p.y,
  },
  {
    key: 'off',
    title: 'Off, %',
    width: 74,
    align: 'right',
    cell: (p) => (p.leftOut ? `${percentText(p.residual)}, out` : percentText(p.residual)),
    sortBy: (p) => p.residual ?? 0,
  },
];

/** Every ring radius of the comparison with its distance from the line. */
export function RadiusTable({ points }: { points: readonly RingPoint[] }) {
  return (
    <Section title="Radii" note="z sin θ is the distance times the sine of the ring's angle" flush>
      <Table
        label="Ring radii"
        columns={columns}
        rows={points}
        rowKey={(p) => `${p.measurementId} ${p.order}`}
        isFirst={(p) => p.leftOut}
      />
    </Section>
  );
}
