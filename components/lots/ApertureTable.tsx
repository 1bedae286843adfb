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
  const { desk, layout } = useLook();
  const [search, setSearch] = useState('');
  const wanted = search.trim().toLowerCase();
  const found = apertures.filter((one) =>
    `${one.serial} ${one.kind} ${one.nominalSizeUm} ${readAperture(one).words}`.toLowerCase().includes(wanted),
  );
  const serial: Column<Aperture> = {
    key: 'serial',
    title: 'Serial',
    width: layout === 'phone' ? 104 : 120,
    sortBy: (row) => row.serial,
    cell: (row) => (
      <Text variant="strong" lines={1}>
        {row.serial}
      </Text>
    ),
  };
  const size: Column<Aperture> = {
    key: 'size',
    title: 'Size, µm',
    width: layout === 'phone' ? 84 : 84,
    align: 'right',
    sortBy: (row) => row.newest?.sizeUm ?? null,
    cell: (row) =>
      row.newest?.sizeUm === null || row.newest === null ? null : (
        <Text variant="medium" style={{ fontSize: 18, lineHeight: 24 }} lines={1}>
          {formatMeasured(row.newest.sizeUm, row.newest.expandedUncertaintyUm).value}
        </Text>
      ),
  };
  const gap: Column<Aperture> = {
    key: 'gap',
    title: desk ? 'In the gap' : '',
    width: desk ? 150 : undefined,
    cell: (row) => {
      const reading = readAperture(row);
      if (
        row.newest === null ||
        row.newest.sizeUm === null ||
        row.toleranceUm === null ||
        (!desk && reading.toLookAt)
      ) {
        return desk ? null : (
          <Text variant="small" lines={1}>
            {reading.words.replace(/^(refused|failed): /, '')}
          </Text>
        );
      }
      return (
        <Slot
          {...apertureLimits(row)}
          value={row.newest.sizeUm}
          uncertainty={row.newest.expandedUncertaintyUm}
          size="sm"
          label={reading.words}
          style={{ width: '100%' }}
        />
      );
    },
  };
  const columns: Column<Aperture>[] = desk
    ? [
        serial,
        {
          key: 'nominal',
          title: 'Nominal',
          width: 110,
          sortBy: (row) => row.nominalSizeUm,
          cell: (row) => nominalText(row.nominalSizeUm, row.toleranceUm),
        },
        size,
        {
          key: 'uncertainty',
          title: '±',
          width: 52,
          align: 'right',
          sortBy: (row) => row.newest?.expandedUncertaintyUm ?? null,
          cell: (row) =>
            row.newest?.sizeUm != null
              ? formatMeasured(row.newest.sizeUm, row.newest.expandedUncertaintyUm).uncertainty
              : null,
        },
        gap,
        {
          key: 'reading',
          title: 'Reading',
          sortBy: (row) => readAperture(row).words,
          cell: (row) => {
            const reading = readAperture(row);
            return <VerdictChip verdict={reading.verdict} words={reading.words} />;
          },
        },
        {
          key: 'stage',
          title: 'Stage',
          width: 110,
          sortBy: (row) => readAperture(row).stage,
          cell: (row) => <StageChip stage={readAperture(row).stage} />,
        },
      ]
    : [
        serial,
        size,
        gap,
        { key: 'stage', title: '', width: 24, cell: (row) => <StageGlyph stage={readAperture(row).stage} /> },
      ];

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
