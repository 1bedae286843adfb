import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from './Icon';
import { Mark } from './Mark';
import { useShellPlaces } from './ShellContext';
import { Text } from './Text';
import { fontFamily, radius, shell, space, stroke } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

/** The places at the left edge of a desk. `tools` stand at its foot. */
export function Rail({ tools }: { tools?: ReactNode }) {
  const { colours } = useLook();
  const { rail, current } = useShellPlaces();
  const corner = { borderTopRightRadius: radius.plate, borderBottomRightRadius: radius.plate };
  return (
    <View role="navigation" aria-label="Places" style={{ width: shell.rail, gap: space.hair }}>
      <Touch
        href="/"
        label="Ringwright, to Today"
        style={{
          height: 72,
          alignItems: 'center',
          justifyContent: 'center',
          backgroundColor: colours.plate,
          ...corner,
        }}
      >
        <Mark size={34} />
      </Touch>
      {rail.map((place) => {
        const here = place.key === current;
        return (
          <Touch
            key={place.key}
            href={place.href}
            current={here}
            style={({ pressed }) => ({
              height: 68,
              alignItems: 'center',
              justifyContent: 'center',
              gap: 4,
              backgroundColor: here || pressed ? colours.lift : colours.plate,
              ...corner,
            })}
          >
            {here ? (
              <View
                style={{
                  position: 'absolute',
                  top: 0,
                  bottom: 0,
                  left: 0,
                  width: stroke.bar,
                  backgroundColor: colours.accent,
                }}
              />
            ) : null}
            <Icon name={place.icon} colour={here ? colours.ink0 : colours.ink2} />
            <Text
              variant="label"
              tone={here ? 'ink0' : 'ink2'}
              style={{ lineHeight: 14, ...(here ? { fontFamily: fontFamily.textBold } : {}) }}
            >
              {place.label}
            </Text>
          </Touch>
        );
      })}
      <View style={{ flex: 1, backgroundColor: colours.plate, ...corner }} />
      {tools}
    </View>
  );
}
