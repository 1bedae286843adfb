import { View } from 'react-native';
import { Icon } from './Icon';
import { useShellPlaces } from './ShellContext';
import { Text } from './Text';
import { fontFamily, shell, space, stroke } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

/** The places at the foot of a phone or tablet. */
export function FootNav() {
  const { colours } = useLook();
  const { foot, current } = useShellPlaces();
  if (foot.length === 0) return null;
  return (
    <View
      role="navigation"
      aria-label="Places"
      style={{ flexDirection: 'row', gap: space.hair, paddingTop: space.hair }}
    >
      {foot.map((place) => {
        const here = place.key === current;
        return (
          <Touch
            key={place.key}
            href={place.href}
            current={here}
            style={({ pressed }) => ({
              flex: 1,
              minWidth: 0,
              height: shell.foot,
              paddingTop: 12,
              alignItems: 'center',
              gap: 3,
              backgroundColor: here || pressed ? colours.lift : colours.plate,
            })}
          >
            {here ? (
              <View
                style={{
                  position: 'absolute',
                  top: 0,
                  left: 0,
                  right: 0,
                  height: stroke.bar,
                  backgroundColor: colours.accent,
                }}
              />
            ) : null}
            <Icon name={place.icon} colour={here ? colours.ink0 : colours.ink2} />
            <Text
              variant="label"
              tone={here ? 'ink0' : 'ink2'}
              lines={1}
              style={here ? { fontFamily: fontFamily.textBold } : null}
            >
              {place.label}
            </Text>
          </Touch>
        );
      })}
    </View>
  );
}
