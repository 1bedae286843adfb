import { View } from 'react-native';
import { Icon } from './Icon';
import { Plate } from './Plate';
import { Text } from './Text';
import { space } from './tokens';

export interface CautionProps {
  /** `eyewear` for beams, `caution` for blades, static and the rest. */
  icon?: 'eyewear' | 'caution';
  children: string;
}

/** A caution where it is needed: short, and never in the way. */
export function Caution({ icon = 'caution', children }: CautionProps) {
  return (
    <Plate>
      <View role="note" style={{ flexDirection: 'row', gap: space.m, alignItems: 'center' }}>
        <Icon name={icon} />
        <Text variant="small" tone="ink1" style={{ flex: 1 }}>
          {children}
        </Text>
      </View>
    </Plate>
  );
}
