import { useId, useState } from 'react';
import { TextInput, View } from 'react-native';
import { FieldFrame } from './FieldFrame';
import { Icon } from './Icon';
import { editableNumber, parseNumber } from './parseNumber';
import { Text } from './Text';
import { fontFamily, radius, space, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';
import { webProps } from './webProps';

export interface NumberFieldProps {
  label: string;
  /** Null: nothing entered. NaN: something that is no number. */
  value: number | null;
  onChange: (value: number | null) => void;
  onBlur?: () => void;
  unit?: string;
  /** Step of − and +; without it there are none. */
  step?: number;
  min?: number;
  max?: number;
  error?: string;
  hint?: string;
  disabled?: boolean;
  testID?: string;
}

/** A number with its unit inside at the right end, and − and + of 48 px for gloves. */
export function NumberField({
  label,
  value,
  onChange,
  onBlur,
  unit,
  step,
  min,
  max,
  error,
  hint,
  disabled,
  testID,
}: NumberFieldProps) {
  const { colours } = useLook();
  const id = useId();
  const [focused, setFocused] = useState(false);
  const [typed, setTyped] = useState<{ text: string; value: number | null } | null>(null);
  const text = typed !== null && Object.is(typed.value, value) ? typed.text : editableNumber(value);

  const change = (next: string) => {
    const parsed = parseNumber(next);
    setTyped({ text: next, value: parsed });
    onChange(parsed);
  };
  const stepBy = (direction: 1 | -1) => {
    if (step === undefined) return;
    const from = value === null || Number.isNaN(value) ? (min ?? 0) : value;
    const next = Math.min(
      max ?? Infinity,
      Math.max(min ?? -Infinity, Number((from + direction * step).toPrecision(12))),
    );
    setTyped(null);
    onChange(next);
  };
  const stepper = (direction: 1 | -1) => (
    <Touch
      label={`${direction === 1 ? 'More' : 'Less'}: ${label}`}
      disabled={disabled}
      onPress={() => stepBy(direction)}
      style={({ pressed }) => ({
        width: target.min,
        minHeight: 60,
        alignItems: 'center',
        justifyContent: 'center',
        borderRadius: radius.plate,
        backgroundColor: pressed ? colours.rule : colours.lift,
      })}
    >
      <Icon name={direction === 1 ? 'plus' : 'minus'} size={20} />
    </Touch>
  );

  return (
    <FieldFrame
      id={id}
      label={label}
      error={error}
      hint={hint}
      focused={focused}
      trailing={
        unit ? (
          <Text tone="ink2" style={{ fontSize: 15 }}>
            {unit}
          </Text>
        ) : null
      }
      beside={
        step === undefined ? null : (
          <View style={{ flexDirection: 'row', gap: space.hair }}>
            {stepper(-1)}
            {stepper(1)}
          </View>
        )
      }
    >
      <TextInput
        testID={testID}
        value={text}
        onChangeText={change}
        onFocus={() => setFocused(true)}
        onBlur={() => {
          setFocused(false);
          onBlur?.();
        }}
        editable={!disabled}
        inputMode="decimal"
        autoComplete="off"
        aria-label={unit ? `${label}, ${unit}` : label}
        {...webProps({
          'aria-invalid': error ? true : undefined,
          'aria-describedby': error || hint ? `${id}-said` : undefined,
        })}
        style={{
          flex: 1,
          minWidth: 0,
          minHeight: 24,
          padding: 0,
          color: disabled ? colours.ink2 : colours.ink0,
          fontFamily: fontFamily.text,
          fontSize: 17,
          lineHeight: 24,
        }}
      />
    </FieldFrame>
  );
}
