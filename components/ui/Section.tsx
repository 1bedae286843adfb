import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Plate } from './Plate';
import { Text } from './Text';
import { space } from './tokens';

export interface SectionProps {
  title: string;
  /** Under the title, small: what the numbers are and their unit. */
  note?: string;
  action?: ReactNode;
  children: ReactNode;
  /** Content runs to the edges of the plate. */
  flush?: boolean;
}

/** A plate with a title of its own. */
export function Section({ title, note, action, children, flush }: SectionProps) {
  return (
    <Plate padding={flush ? 'none' : 'block'}>
      <View
        style={[
          { flexDirection: 'row', alignItems: 'center', gap: space.m, marginBottom: space.s },
          flush ? { paddingHorizontal: 20, paddingTop: 14 } : null,
        ]}
      >
        <View style={{ flex: 1 }}>
          <Text variant="section" level={2}>
            {title}
          </Text>
          {note ? <Text variant="label">{note}</Text> : null}
        </View>
        {action}
      </View>
      {children}
    </Plate>
  );
}
