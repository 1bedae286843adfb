import { useState } from 'react';
import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { SearchField } from '@/components/ui/SearchField';
import { Slot } from '@/components/ui/Slot';
import { StageChip, StageGlyph } from '@/components/ui/StageGlyph';
import { Table, type Column } from '@/components/ui/Table';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { VerdictChip } from '@/components/ui/VerdictGlyph';
import type { Aperture } from '@/shared/contracts/lots';
import { formatMeasured } from '@/shared/units/format';
import { apertureLimits, readAperture } from './apertureReading';
import { nominalText, sizeSentence } from './apertureWords';

export interface ApertureTableProps {
  lotId: string;
  apertures: readonly Aperture[];
  selectedId: string | null;
}

/** The pieces of a lot: serial, size, place between the limits, stage. Those that need a person are lifted. */
export function ApertureTable({ lotId, apertures, selectedId }: ApertureTableProps) {
  const { desk, widthPx } = useLook();
  const [search, setSearch] = useState('');
  const wanted = search.trim().toLowerCase();
  const found = apertures.filter((one) =>
    `${one.serial} ${one.kind} ${one.nominalSizeUm} ${readAperture(one).words}`.toLowerCase().includes(wanted),
  );
  const alike = apertures.every(
    (one) => one.nominalSizeUm === apertures[0]?.nominalSizeUm && one.toleranceUm === apertures[0]?.toleranceUm,
  );
  const columns = desk ? deskColumns({ withNominal: !alike, withStageWords: widthPx >= 1400 }) : handColumns;

  return (
    <View style={{ gap: space.hair }}>
      {apertures.length > 8 ? (
        <SearchField label="Search apertures" placeholder="Serial, size or state" value={search} onChange={setSearch} />
      ) : null}
      {found.length === 0 && apertures.length > 0 ? (
        <EmptyState sentence={`No aperture fits “${search}”.`} />
      ) : (
        <Table
          label="Apertures"
          columns={columns}
          rows={found}
          rowKey={(row) => row.id}
          rowLabel={(row) =>
            sizeSentence(
              row.serial,
              row.newest?.sizeUm ?? null,
              row.newest?.expandedUncertaintyUm ?? null,
              readAperture(row).words,
            )
          }
          rowHref={(row) => `/lots/${lotId}?aperture=${row.id}`}
          selectedKey={selectedId}
          isFirst={(row) => readAperture(row).toLookAt}
        />
      )}
    </View>
  );
}

function sizeFigure(row: Aperture) {
  return row.newest?.sizeUm == null ? null : (
    <Text variant="medium" style={{ fontSize: 18, lineHeight: 24 }} lines={1}>
      {formatMeasured(row.newest.sizeUm, row.newest.expandedUncertaintyUm).value}
    </Text>
  );
}

function sizeInGap(row: Aperture) {
  if (row.newest?.sizeUm == null || row.toleranceUm === null) return null;
  return (
    <Slot
      {...apertureLimits(row)}
      value={row.newest.sizeUm}
      uncertainty={row.newest.expandedUncertaintyUm}
      size="sm"
      label={readAperture(row).words}
      style={{ width: '100%' }}
    />
  );
}

const serialColumn: Column<Aperture> = {
  key: 'serial',
  title: 'Serial',
  width: 112,
  sortBy: (row) => row.serial,
  cell: (row) => (
    <Text variant="strong" lines={1}>
      {row.serial}
    </Text>
  ),
};

/** Serial, size with its place in the gap or the reason for none, stage. */
const handColumns: readonly Column<Aperture>[] = [
  { ...serialColumn, width: 104 },
  {
    key: 'size',
    title: 'Size, µm',
    sortBy: (row) => row.newest?.sizeUm ?? null,
    cell: (row) => {
      const reading = readAperture(row);
      const gap = reading.toLookAt ? null : sizeInGap(row);
      return (
        <View style={{ width: '100%', flexDirection: 'row', alignItems: 'center', gap: space.m }}>
          {row.newest?.sizeUm == null ? null : (
            <View style={{ minWidth: 78, flexShrink: 0, alignItems: 'flex-end' }}>{sizeFigure(row)}</View>
          )}
          <View style={{ flex: 1, minWidth: 0 }}>
            {gap ?? (
              <Text variant="small" lines={1}>
                {reading.words.replace(/^(refused|failed): /, '').replace(/ (the|a) limit/, ' limit')}
              </Text>
            )}
          </View>
        </View>
      );
    },
  },
  {
    key: 'stage',
    title: 'Stage',
    hideTitle: true,
    width: 24,
    cell: (row) => <StageGlyph stage={readAperture(row).stage} />,
  },
];

function deskColumns({
  withNominal,
  withStageWords,
}: {
  withNominal: boolean;
  withStageWords: boolean;
}): readonly Column<Aperture>[] {
  const nominal: Column<Aperture> = {
    key: 'nominal',
    title: 'Nominal',
    width: 100,
    sortBy: (row) => row.nominalSizeUm,
    cell: (row) => nominalText(row.nominalSizeUm, row.toleranceUm),
  };
  return [
    serialColumn,
    ...(withNominal ? [nominal] : []),
    {
      key: 'size',
      title: 'Size, µm',
      width: 84,
      align: 'right',
      sortBy: (row) => row.newest?.sizeUm ?? null,
      cell: sizeFigure,
    },
    {
      key: 'uncertainty',
      title: '±',
      width: 48,
      align: 'right',
      sortBy: (row) => row.newest?.expandedUncertaintyUm ?? null,
      cell: (row) =>
        row.newest?.sizeUm == null
          ? null
          : formatMeasured(row.newest.sizeUm, row.newest.expandedUncertaintyUm).uncertainty,
    },
    { key: 'gap', title: 'In the gap', width: 140, cell: sizeInGap },
    {
      key: 'reading',
      title: 'Reading',
      sortBy: (row) => readAperture(row).words,
      cell: (row) => {
        const reading = readAperture(row);
        return <VerdictChip verdict={reading.verdict} words={reading.words} />;
      },
    },
    withStageWords
      ? {
          key: 'stage',
          title: 'Stage',
          width: 104,
          sortBy: (row) => readAperture(row).stage,
          cell: (row) => <StageChip stage={readAperture(row).stage} />,
        }
      : {
          key: 'stage',
          title: 'Stage',
          hideTitle: true,
          width: 24,
          cell: (row) => <StageGlyph stage={readAperture(row).stage} />,
        },
  ];
}
