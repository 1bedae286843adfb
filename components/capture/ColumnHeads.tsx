import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import { frameColumns } from './frameColumns';

/** Heads over the rows of frames. */
export function ColumnHeads() {
  const { desk } = useLook();
  if (!desk) {
    return (
      <View style={{ flexDirection: 'row', paddingLeft: 68, paddingRight: 56, paddingTop: 6, paddingBottom: 3 }}>
        <Text variant="label" style={{ flex: 1 }}>
          Peak in its gap
        </Text>
        <Text variant="label">Size, µm</Text>
      </View>
    );
  }
  const head = (text: string, width: number, align: 'left' | 'right') => (
    <Text variant="label" align={align} style={{ width }} lines={1}>
      {text}
    </Text>
  );
  return (
    <View
      style={{
        flexDirection: 'row',
        gap: frameColumns.gap,
        paddingLeft: frameColumns.thumbnail + frameColumns.gap,
        paddingRight: frameColumns.more,
        paddingTop: 8,
        paddingBottom: 4,
      }}
    >
      <Text variant="label" style={{ flex: 1 }}>
        File
      </Text>
      {head('Exposure', frameColumns.exposure, 'right')}
      {head('Peak in its gap', frameColumns.peak, 'left')}
      {head('Noise', frameColumns.noise, 'right')}
      {head('Size, µm', frameColumns.outcome, 'right')}
    </View>
  );
}
