import { View } from 'react-native';
import { Icon } from '@/components/ui/Icon';
import { Text } from '@/components/ui/Text';
import { radius, target } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';

interface Props {
  label: string;
  on: boolean;
  onChange: (on: boolean) => void;
}

/** A box to tick in the narrow panels of the viewer: lower on a desk, where a mouse points. */
export function LayerToggle({ label, on, onChange }: Props) {
  const { colours, desk } = useLook();
  return (
    <Touch
      role="checkbox"
      checked={on}
      label={label}
      onPress={() => onChange(!on)}
      style={{ minHeight: desk ? 28 : target.min, flexDirection: 'row', alignItems: 'center', gap: 9 }}
    >
      <View
        style={{
          width: 20,
          height: 20,
          alignItems: 'center',
          justifyContent: 'center',
          borderWidth: 1.5,
          borderRadius: radius.plate,
          borderColor: on ? colours.ink1 : colours.ink3,
          backgroundColor: on ? colours.ink1 : 'transparent',
        }}
      >
        {on ? <Icon name="tick" size={15} strokeWidth={2.5} colour={colours.plate} /> : null}
      </View>
      <Text variant={desk ? 'small' : 'body'}>{label}</Text>
    </Touch>
  );
}
