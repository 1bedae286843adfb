import { View } from 'react-native';
import { Icon } from '@/components/ui/Icon';
import { Text } from '@/components/ui/Text';
import { radius } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

/** The place where stills are dropped on a desk; they are taken anywhere on the page. */
export function DropZone({ over }: { over: boolean }) {
  const { colours } = useLook();
  return (
    <View
      style={{
        flexGrow: 1,
        minHeight: 120,
        marginTop: 6,
        borderWidth: 1.5,
        borderStyle: 'dashed',
        borderColor: over ? colours.accent : colours.ink3,
        backgroundColor: over ? colours.lift : colours.gap,
        borderRadius: radius.plate,
        flexDirection: 'row',
        alignItems: 'center',
        justifyContent: 'center',
        gap: 14,
        padding: 16,
      }}
    >
      <Icon name="put" colour={over ? colours.ink0 : colours.ink2} />
      <Text tone={over ? 'ink0' : 'ink2'} style={{ flexShrink: 1 }}>
        {over ? 'Let go to add them.' : 'Drop stills here. TIFF, PNG or JPEG. Nothing is renamed or changed.'}
      </Text>
    </View>
  );
}
