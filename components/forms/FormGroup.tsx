import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';

/** Fields that belong together, under a title and a sentence on what they are for. */
export function FormGroup({ title, note, children }: { title: string; note?: string; children: ReactNode }) {
  return (
    <View role="group" aria-label={title} style={{ gap: space.hair, paddingTop: space.l }}>
      <View style={{ paddingBottom: space.s, gap: 2 }}>
        <Text variant="section" level={2}>
          {title}
        </Text>
        {note ? (
          <Text variant="small" tone="ink2">
            {note}
          </Text>
        ) : null}
      </View>
      {children}
    </View>
  );
}
