import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from './Icon';
import { Text } from './Text';
import { radius, space, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface CheckBoxProps {
  checked: boolean;
  onChange: (checked: boolean) => void;
  /** Shown beside the box, unless `children` are. */
  label: string;
  hint?: string;
  /** A whole row beside the box; all of it can be touched. */
  children?: ReactNode;
  disabled?: boolean;
  testID?: string;
}

/** A square box; the tick says chosen, not the colour. */
export function CheckBox({ checked, onChange, label, hint, children, disabled, testID }: CheckBoxProps) {
  const { colours, desk } = useLook();
  const side = desk ? 20 : 24;
  return (
    <Touch
      testID={testID}
      role="checkbox"
      checked={checked}
      disabled={disabled}
      label={label}
      onPress={() => onChange(!checked)}
      style={{
        minHeight: target.min,
        minWidth: target.min,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
      }}
    >
      <View
        style={{
          width: side,
          height: side,
          alignItems: 'center',
          justifyContent: 'center',
          borderRadius: radius.plate,
          borderWidth: 1.75,
          borderColor: checked ? colours.ink1 : colours.ink3,
          backgroundColor: checked ? colours.ink1 : 'transparent',
        }}
      >
        {checked ? <Icon name="tick" size={side - 6} strokeWidth={2.5} colour={colours.plate} /> : null}
      </View>
      {children ?? (
        <View style={{ flexShrink: 1 }}>
          <Text>{label}</Text>
          {hint ? (
            <Text variant="small" tone="ink2">
              {hint}
            </Text>
          ) : null}
        </View>
      )}
    </Touch>
  );
}
