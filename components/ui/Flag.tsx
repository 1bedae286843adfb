import { View } from 'react-native';
import { Icon } from './Icon';
import { Text } from './Text';
import { space } from './tokens';

export interface FlagProps {
  /** The flag's name in words. */
  title: string;
  /** What it costs in µm, or what to do. */
  detail: string;
}

/** Something to know about a result. */
export function Flag({ title, detail }: FlagProps) {
  return (
    <View style={{ flexDirection: 'row', gap: space.m, paddingVertical: 4 }}>
      <View style={{ marginTop: 1 }}>
        <Icon name="flag" size={20} />
      </View>
      <View style={{ flex: 1 }}>
        <Text variant="strong">{title}</Text>
        <Text variant="small" tone="ink2">
          {detail}
        </Text>
      </View>
    </View>
  );
}
