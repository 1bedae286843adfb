import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

/** The place of the darks: how many there are, and what they are for while there are none. */
export function DarksHead({ count }: { count: number }) {
  const { desk } = useLook();
  return (
    <View style={{ paddingHorizontal: desk ? 20 : space.l, paddingTop: space.l, paddingBottom: space.xs }}>
      <Text variant="section" level={2}>
        Darks
      </Text>
      <Text variant="small" tone="ink2">
        {count === 0
          ? 'None yet. Close the shutter and take three to five at the same exposure; without them the black level is estimated.'
          : `${count === 1 ? '1 frame' : `${count} frames`}, taken off every light of this capture.`}
      </Text>
    </View>
  );
}
