import { View } from 'react-native';
import { Text } from './Text';
import { space } from './tokens';
import { useLook } from './useLook';

/** Under the rule while there is no network. */
export function OfflineLine({
  online,
  sentence = 'No network. What you see may be old; it is read again by itself.',
}: {
  online: boolean;
  sentence?: string;
}) {
  const { colours, desk } = useLook();
  return (
    <View role="status" aria-live="polite">
      {online ? null : (
        <View
          style={{
            backgroundColor: colours.lift,
            marginBottom: space.hair,
            paddingVertical: space.s,
            paddingHorizontal: desk ? 24 : space.l,
          }}
        >
          <Text variant="small" tone="ink0">
            {sentence}
          </Text>
        </View>
      )}
    </View>
  );
}
