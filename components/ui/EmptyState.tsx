import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Plate } from './Plate';
import { Text } from './Text';
import { space } from './tokens';

export interface EmptyStateProps {
  /** One sentence: what is so, then what to do. */
  sentence: string;
  /** One button. */
  action?: ReactNode;
}

/** Stands where the content will be. */
export function EmptyState({ sentence, action }: EmptyStateProps) {
  return (
    <Plate>
      <View style={{ gap: space.l, maxWidth: 460, paddingVertical: space.s }}>
        <Text>{sentence}</Text>
        {action ? <View style={{ alignSelf: 'flex-start' }}>{action}</View> : null}
      </View>
    </Plate>
  );
}
