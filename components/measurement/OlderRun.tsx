import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { MeasurementDetail } from '@/shared/contracts/measurements';

/** Said on a run that a newer one of the same frame stands beside. */
export function OlderRun({ measurement }: { measurement: MeasurementDetail }) {
  const newest = measurement.history[0];
  return (
    <Plate surface="lift">
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
        <Text variant="small" tone="ink0" style={{ flex: 1 }}>
          An older run. A newer one of the same frame stands beside it.
        </Text>
        {newest ? <Button dense label="Go to the newest" href={`/measurements/${newest.id}`} /> : null}
      </View>
    </Plate>
  );
}
