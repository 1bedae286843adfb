import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from './Text';
import { radius, space, stroke } from './tokens';
import { useLook } from './useLook';

export interface FieldFrameProps {
  id: string;
  label: string;
  error?: string;
  hint?: string;
  focused: boolean;
  trailing?: ReactNode;
  /** Outside the sunk plate, at its right: the − and + of a number. */
  beside?: ReactNode;
  tall?: boolean;
  children: ReactNode;
}

/** The plate around every field: label above, line below, sentence under it when something is wrong. */
export function FieldFrame({ id, label, error, hint, focused, trailing, beside, tall, children }: FieldFrameProps) {
  const { colours } = useLook();
  const line = error ? colours.ink0 : focused ? colours.accent : colours.ink3;
  return (
    <View style={{ gap: 4 }}>
      <View style={{ flexDirection: 'row', gap: space.hair }}>
        <View
          style={{
            flex: 1,
            minWidth: 0,
            minHeight: 60,
            backgroundColor: colours.well,
            borderRadius: radius.plate,
            paddingTop: 9,
            paddingHorizontal: 14,
            paddingBottom: 10,
          }}
        >
          <Text variant="label" lines={1}>
            {label}
          </Text>
          <View style={{ flexDirection: 'row', alignItems: tall ? 'flex-start' : 'center', gap: space.s }}>
            {children}
            {trailing}
          </View>
          <View
            style={{ position: 'absolute', left: 0, right: 0, bottom: 0, height: stroke.line, backgroundColor: line }}
          />
          {error ? (
            <View
              style={{
                position: 'absolute',
                left: 0,
                right: 0,
                bottom: 3.5,
                height: stroke.line,
                backgroundColor: line,
              }}
            />
          ) : null}
        </View>
        {beside}
      </View>
      {error ? (
        <Text id={`${id}-said`} variant="small" tone="ink0" live style={{ paddingHorizontal: 14, paddingBottom: 4 }}>
          {error}
        </Text>
      ) : hint ? (
        <Text id={`${id}-said`} variant="small" tone="ink2" style={{ paddingHorizontal: 14, paddingBottom: 4 }}>
          {hint}
        </Text>
      ) : null}
    </View>
  );
}
