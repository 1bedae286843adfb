import { useState } from 'react';
import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { Row } from '@/components/ui/Row';
import { SearchField } from '@/components/ui/SearchField';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Lot } from '@/shared/contracts/lots';
import { dueWords } from './apertureWords';
import { LotStrip } from './LotStrip';

/** Lots with how far each is, to be searched by number, client or order. */
export function LotList({ lots }: { lots: readonly Lot[] }) {
  const { layout } = useLook();
  const [search, setSearch] = useState('');
  const wanted = search.trim().toLowerCase();
  const found = lots.filter((lot) =>
    `${lot.number} ${lot.clientName} ${lot.orderReference}`.toLowerCase().includes(wanted),
  );
  return (
    <View style={{ gap: space.hair }}>
      {lots.length > 5 ? (
        <SearchField label="Search lots" placeholder="Number, client or order" value={search} onChange={setSearch} />
      ) : null}
      {found.map((lot) => (
        <Row
          key={lot.id}
          icon="lots"
          title={lot.number}
          aside={lot.clientName}
          subtitle={[
            `${lot.apertureCount} ${lot.apertureCount === 1 ? 'aperture' : 'apertures'}`,
            dueWords(lot.dueOn),
          ].join(', ')}
          href={`/lots/${lot.id}`}
          trailing={
            <LotStrip
              apertureCount={lot.apertureCount}
              measuredCount={lot.measuredCount}
              refusedCount={lot.refusedCount}
              style={{ width: layout === 'phone' ? 84 : 118 }}
            />
          }
        />
      ))}
      {found.length === 0 && lots.length > 0 ? <EmptyState sentence={`No lot fits “${search}”.`} /> : null}
    </View>
  );
}
