import type { Href } from 'expo-router';
import { View } from 'react-native';
import { Button } from './Button';
import type { IconName } from './iconDrawings';
import { space } from './tokens';

export interface Way {
  label: string;
  icon: IconName;
  href: Href;
}

/** Quiet ways on, side by side at the foot of a page. */
export function TwoWays({ ways }: { ways: readonly Way[] }) {
  return (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      {ways.map((way) => (
        <Button
          key={way.label}
          label={way.label}
          icon={way.icon}
          href={way.href}
          kind="quiet"
          fullBleed
          style={{ flex: 1, minHeight: 64 }}
        />
      ))}
    </View>
  );
}
