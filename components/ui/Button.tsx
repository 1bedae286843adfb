import { View, type StyleProp, type ViewStyle } from 'react-native';
import type { Href } from 'expo-router';
import { Icon } from './Icon';
import type { IconName } from './iconDrawings';
import { Text } from './Text';
import { radius, space, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface ButtonProps {
  /** A verb with its object: “Take frames”. */
  label: string;
  onPress?: () => void;
  href?: Href;
  /** `primary` is the one lit button of a screen; `quiet` has no surface of its own weight. */
  kind?: 'primary' | 'plain' | 'quiet';
  /** At the left, before the label. */
  icon?: IconName;
  /** At the right end; a primary button that goes on carries `fwd`. */
  trailing?: IconName | null;
  disabled?: boolean;
  /** Why it cannot be pressed; stands beside it. Without a reason nothing should be disabled. */
  reason?: string;
  /** Work is under way: the button waits and says so. */
  busy?: boolean;
  /** No rounded corners and no margin: at the foot of a phone. */
  fullBleed?: boolean;
  /** Lower, for heads of panels. */
  dense?: boolean;
  style?: StyleProp<ViewStyle>;
  testID?: string;
}

/** A plate that does something. */
export function Button({
  label,
  onPress,
  href,
  kind = 'plain',
  icon,
  trailing,
  disabled,
  reason,
  busy,
  fullBleed,
  dense,
  style,
  testID,
}: ButtonProps) {
  const { colours, desk } = useLook();
  const off = disabled === true || busy === true;
  const primary = kind === 'primary';
  const ink = off ? colours.ink2 : primary ? colours.onAccent : kind === 'quiet' ? colours.ink1 : colours.ink0;
  const height = dense
    ? target.min
    : primary
      ? desk
        ? target.control
        : target.primary
      : desk
        ? target.min
        : target.control;
  const ground = off ? colours.plate : primary ? colours.accent : kind === 'quiet' ? colours.plate : colours.lift;
  const end = trailing === undefined ? (primary ? 'fwd' : null) : trailing;
  return (
    <Touch
      testID={testID}
      onPress={onPress}
      href={off ? undefined : href}
      label={reason && off ? undefined : label}
      disabled={off}
      style={({ pressed }) => [
        {
          minHeight: height,
          backgroundColor: pressed && !primary ? colours.rule : ground,
          opacity: pressed && primary ? 0.86 : 1,
          borderRadius: fullBleed ? 0 : radius.plate,
          flexDirection: 'row',
          alignItems: 'center',
          gap: space.m,
          paddingHorizontal: dense ? 14 : 18,
          paddingVertical: 6,
        },
        style,
      ]}
    >
      {icon ? <Icon name={icon} size={dense ? 20 : 24} colour={ink} /> : null}
      <View style={{ flexShrink: 1 }}>
        <Text
          variant={kind === 'quiet' ? 'body' : 'strong'}
          style={[{ color: ink }, primary && !desk ? { fontSize: 18 } : null]}
        >
          {busy ? `${label} …` : label}
        </Text>
        {reason && off ? <Text variant="label">{reason}</Text> : null}
      </View>
      {end ? (
        <View style={{ marginLeft: 'auto' }}>
          <Icon name={end} colour={ink} />
        </View>
      ) : null}
    </Touch>
  );
}
