import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from './Icon';
import type { IconName } from './iconDrawings';
import { Text } from './Text';
import { radius, shell, space, stroke } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface RowProps {
  /** At the left: a drawing by name, or a glyph or thumbnail. */
  icon?: IconName;
  leading?: ReactNode;
  title: string;
  /** Beside the title in ink2. */
  aside?: string;
  subtitle?: string;
  /** At the right: a number, a slot, a chip. */
  trailing?: ReactNode;
  href?: Href;
  onPress?: () => void;
  /** Chosen in a list: lifted, with a bar at the left. */
  selected?: boolean;
  /** One of a group of which one is chosen: says so to screen readers. */
  choice?: boolean;
  /** Needs a person: stands first, on `lift`. */
  first?: boolean;
  /** 46 px on a desk in place of 64. */
  dense?: boolean;
  /** What a screen reader says; otherwise title and subtitle. */
  label?: string;
  testID?: string;
}

/** One line of a list. With `href` or `onPress` the whole row is touched. */
export function Row({
  icon,
  leading,
  title,
  aside,
  subtitle,
  trailing,
  href,
  onPress,
  selected,
  choice,
  first,
  dense,
  label,
  testID,
}: RowProps) {
  const { colours, desk } = useLook();
  const goes = href !== undefined || onPress !== undefined;
  const start = leading ?? (icon ? <Icon name={icon} colour={colours.ink1} /> : null);
  const frame = (pressed: boolean) => ({
    minHeight: dense ? (desk ? shell.rowDesk : 54) : desk ? shell.row : 72,
    flexDirection: 'row' as const,
    alignItems: 'center' as const,
    gap: space.m,
    paddingLeft: start ? 0 : desk ? 20 : space.l,
    paddingRight: space.l,
    paddingVertical: 6,
    borderRadius: radius.plate,
    backgroundColor: pressed || selected || first ? colours.lift : colours.plate,
  });
  const content = (
    <>
      {selected ? (
        <View
          style={{
            position: 'absolute',
            left: 0,
            top: 0,
            bottom: 0,
            width: stroke.bar,
            backgroundColor: colours.accent,
          }}
        />
      ) : null}
      {start ? (
        <View style={{ width: desk ? 48 : 56, alignItems: 'center', marginRight: -space.m }}>{start}</View>
      ) : null}
      <View style={{ flex: 1, minWidth: 0 }}>
        <Text lines={1}>
          <Text variant="strong">{title}</Text>
          {aside ? <Text tone="ink2">{`  ${aside}`}</Text> : null}
        </Text>
        {subtitle ? (
          <Text variant="small" tone="ink2" lines={2}>
            {subtitle}
          </Text>
        ) : null}
      </View>
      {trailing ?? (goes ? <Icon name="fwd" size={desk ? 18 : 20} /> : null)}
    </>
  );
  if (!goes) {
    return (
      <View testID={testID} style={frame(false)}>
        {content}
      </View>
    );
  }
  return (
    <Touch
      testID={testID}
      href={href}
      onPress={onPress}
      label={label}
      role={choice ? 'radio' : undefined}
      checked={choice ? selected === true : undefined}
      current={!choice && selected}
      style={({ pressed }) => frame(pressed)}
    >
      {content}
    </Touch>
  );
}
