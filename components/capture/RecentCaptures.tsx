import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { Capture } from '@/shared/contracts/captures';
import { formatDateTime } from '@/shared/units/format';

const frames = (count: number) => (count === 1 ? '1 frame' : `${count} frames`);

/** The newest captures, to go on with one of them. */
export function RecentCaptures({ captures }: { captures: readonly Capture[] }) {
  if (captures.length === 0) return <EmptyState sentence="No captures yet. Choose a bench and a piece, then begin." />;
  return (
    <View role="list" style={{ gap: space.hair }}>
      {captures.slice(0, 20).map((capture) => (
        <View key={capture.id} role="listitem">
          <Row
            icon="capture"
            title={capture.apertureSerial}
            subtitle={`${formatDateTime(capture.createdAt)}, ${capture.benchName}`}
            href={`/captures/${capture.id}`}
            trailing={
              <Text variant="small" tone="ink2" lines={1}>
                {`${capture.measuredCount} of ${frames(capture.lightCount)}`}
              </Text>
            }
          />
        </View>
      ))}
    </View>
  );
}
