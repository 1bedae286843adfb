import { View } from 'react-native';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { BenchRevision } from '@/shared/contracts/benches';
import { formatDateTime } from '@/shared/units/format';
import { enteredWithUncertainty, illuminationWords, plainQuantity } from './benchWords';

/** What a bench was and when: measurements keep the revision that they used. */
export function RevisionList({ revisions }: { revisions: readonly BenchRevision[] }) {
  return (
    <View style={{ gap: space.hair }}>
      <Plate>
        <Text variant="small" tone="ink2">
          A measurement keeps the revision that it used.
        </Text>
      </Plate>
      {revisions.map((revision, i) => (
        <Plate key={revision.id} surface={i === 0 ? 'lift' : 'plate'}>
          <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: space.m, marginBottom: space.xs }}>
            <Text variant="strong">
              {i === 0 ? `Revision ${revision.revision}, now` : `Revision ${revision.revision}`}
            </Text>
          </View>
          <Text variant="small" tone="ink2" style={{ marginBottom: space.s }}>
            {`${formatDateTime(revision.createdAt)}, ${revision.createdBy}`}
          </Text>
          <KeyValueList
            entries={[
              ['Distance', enteredWithUncertainty(revision.distanceMm, revision.distanceUncertaintyMm, 'mm')],
              ['Laser', `${revision.laser.name}, ${plainQuantity(revision.laser.wavelengthNm, 'nm')}`],
              ['Camera', revision.camera.name],
              ['Illumination', illuminationWords(revision.illumination)],
            ]}
          />
          {revision.note ? (
            <Text variant="small" style={{ marginTop: space.s }}>
              {revision.note}
            </Text>
          ) : null}
        </Plate>
      ))}
    </View>
  );
}
