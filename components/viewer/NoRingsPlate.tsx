import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { radius } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { NoRings } from './ViewerProps';

/** Says why a frame has no rings and what to do. */
export function NoRingsPlate({ noRings }: { noRings: NoRings }) {
  const { colours } = useLook();
  return (
    <View
      style={{
        backgroundColor: colours.plate,
        borderRadius: radius.plate,
        paddingHorizontal: 16,
        paddingVertical: 12,
        gap: 4,
        minHeight: 66,
      }}
    >
      <Text variant="strong">{noRings.title}</Text>
      <Text variant="small">{noRings.message}</Text>
    </View>
  );
}
