import { Fragment, type ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from './Text';
import { space } from './tokens';
import { useLook } from './useLook';

export interface KeyValueListProps {
  entries: readonly (readonly [name: string, value: ReactNode])[];
}

/** Names at the left in ink2, values at the right. */
export function KeyValueList({ entries }: KeyValueListProps) {
  const { desk } = useLook();
  return (
    <View style={{ gap: desk ? 3 : 6 }}>
      {entries.map(([name, value]) => (
        <View key={name} style={{ flexDirection: 'row', justifyContent: 'space-between', gap: space.m }}>
          <Text variant={desk ? 'small' : 'body'} tone="ink2" style={{ flexShrink: 0, maxWidth: '55%' }}>
            {name}
          </Text>
          {typeof value === 'string' || typeof value === 'number' ? (
            <Text variant={desk ? 'small' : 'body'} tone="ink1" align="right" style={{ flexShrink: 1 }}>
              {value}
            </Text>
          ) : (
            <Fragment>{value}</Fragment>
          )}
        </View>
      ))}
    </View>
  );
}
