import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { IconButton } from './IconButton';
import { Text } from './Text';
import { shell, space } from './tokens';

export interface ScreenHeadProps {
  title: string;
  subtitle?: string;
  /** At the right, in ink2. */
  note?: string;
  back?: Href;
  action?: ReactNode;
  level: 1 | 2;
}

/** Head of a screen on a phone or tablet. A place of the shell has a large title; what lies below it has an arrow back. */
export function ScreenHead({ title, subtitle, note, back, action, level }: ScreenHeadProps) {
  if (back === undefined) {
    return (
      <View
        style={{
          minHeight: level === 1 ? shell.head + 4 : 44,
          paddingLeft: space.l,
          paddingRight: level === 1 || action ? 4 : space.l,
          flexDirection: 'row',
          alignItems: 'center',
          gap: space.m,
        }}
      >
        <Text
          variant="title"
          level={level}
          style={level === 1 ? { fontSize: 26, lineHeight: 32, flexShrink: 1 } : { flexShrink: 1 }}
        >
          {title}
        </Text>
        {(subtitle ?? note) ? (
          <View style={{ marginLeft: 'auto', flexShrink: 1 }}>
            <Text variant="small" tone="ink2" align="right">
              {subtitle ?? note}
            </Text>
          </View>
        ) : null}
        <View style={{ marginLeft: subtitle || note ? 0 : 'auto', flexDirection: 'row', alignItems: 'center' }}>
          {action}
          {level === 1 ? <IconButton icon="more" label="More: people, mail, account" href="/more" /> : null}
        </View>
      </View>
    );
  }
  return (
    <View
      style={{ minHeight: shell.head, flexDirection: 'row', alignItems: 'center', paddingRight: action ? 4 : space.l }}
    >
      <IconButton icon="back" label="Back" href={back} />
      <View style={{ flex: 1, minWidth: 0, paddingVertical: 4 }}>
        <Text variant="strong" level={level} lines={1} style={{ lineHeight: 20 }}>
          {title}
        </Text>
        {subtitle ? (
          <Text variant="small" tone="ink2" lines={1}>
            {subtitle}
          </Text>
        ) : null}
      </View>
      {action}
    </View>
  );
}
