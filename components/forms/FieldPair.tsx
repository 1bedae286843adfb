import { Children, type ReactNode } from 'react';
import { View } from 'react-native';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

/** Fields side by side where there is room, one under the other on a phone. */
export function FieldPair({ children }: { children: ReactNode }) {
  const { layout } = useLook();
  if (layout === 'phone') return <>{children}</>;
  return (
    <View style={{ flexDirection: 'row', gap: space.hair, alignItems: 'flex-start' }}>
      {Children.toArray(children).map((child, i) => (
        <View key={i} style={{ flex: 1, minWidth: 0 }}>
          {child}
        </View>
      ))}
    </View>
  );
}
