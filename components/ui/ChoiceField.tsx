import { useId, useState } from 'react';
import { View } from 'react-native';
import type { ChoiceFieldProps } from './choice';
import { FieldFrame } from './FieldFrame';
import { Icon } from './Icon';
import { Text } from './Text';
import { space, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

/** One of several; the list opens below the field. */
export function ChoiceField<V extends string>({
  label,
  value,
  choices,
  onChange,
  onBlur,
  placeholder,
  error,
  hint,
  disabled,
  testID,
}: ChoiceFieldProps<V>) {
  const { colours } = useLook();
  const id = useId();
  const [open, setOpen] = useState(false);
  const chosen = choices.find((choice) => choice.value === value);
  return (
    <View>
      <Touch
        testID={testID}
        label={`${label}: ${chosen?.label ?? placeholder ?? 'Choose'}`}
        expanded={open}
        disabled={disabled}
        onPress={() => setOpen(!open)}
        style={{}}
      >
        <FieldFrame
          id={id}
          label={label}
          error={error}
          hint={hint}
          focused={open}
          trailing={<Icon name="down" size={20} />}
        >
          <Text tone={chosen ? 'ink0' : 'ink2'} lines={1} style={{ flex: 1, fontSize: 17, lineHeight: 24 }}>
            {chosen?.label ?? placeholder ?? 'Choose'}
          </Text>
        </FieldFrame>
      </Touch>
      {open ? (
        <View role="radiogroup" aria-label={label} style={{ gap: space.hair, paddingTop: space.hair }}>
          {choices.map((choice) => (
            <Touch
              key={choice.value}
              role="radio"
              checked={choice.value === value}
              onPress={() => {
                onChange(choice.value);
                setOpen(false);
                onBlur?.();
              }}
              style={{
                minHeight: target.min,
                justifyContent: 'center',
                paddingHorizontal: 14,
                backgroundColor: colours.lift,
              }}
            >
              <Text variant={choice.value === value ? 'strong' : 'body'}>{choice.label}</Text>
            </Touch>
          ))}
        </View>
      ) : null}
    </View>
  );
}
