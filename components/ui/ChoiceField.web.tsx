import { useId, useState } from 'react';
import type { ChoiceFieldProps } from './choice';
import { View } from 'react-native';
import { FieldFrame } from './FieldFrame';
import { Icon } from './Icon';
import { fontFamily } from './tokens';
import { useLook } from './useLook';

/** One of several; the browser's own list opens, so that keys, screen readers and phones know it. */
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
  const [focused, setFocused] = useState(false);
  const chosen = choices.some((choice) => choice.value === value);
  return (
    <FieldFrame id={id} label={label} error={error} hint={hint} focused={focused} trailing={<ArrowOverRoom />}>
      <select
        data-testid={testID}
        aria-label={label}
        aria-invalid={error ? true : undefined}
        aria-describedby={error || hint ? `${id}-said` : undefined}
        disabled={disabled}
        value={chosen && value !== null ? value : ''}
        onChange={(event) => {
          const next = choices.find((choice) => choice.value === event.target.value);
          if (next) onChange(next.value);
        }}
        onFocus={() => setFocused(true)}
        onBlur={() => {
          setFocused(false);
          onBlur?.();
        }}
        style={{
          // The control covers the whole plate, so that a touch anywhere on it opens the list.
          position: 'absolute',
          left: -14,
          right: -14,
          top: -25,
          width: 'calc(100% + 28px)',
          height: 60,
          padding: '25px 42px 8px 14px',
          boxSizing: 'border-box',
          appearance: 'none',
          border: 0,
          borderRadius: 2,
          backgroundColor: 'transparent',
          color: chosen && !disabled ? colours.ink0 : colours.ink2,
          fontFamily: fontFamily.text,
          fontSize: 17,
          lineHeight: '22px',
          textOverflow: 'ellipsis',
          zIndex: 1,
        }}
      >
        {chosen ? null : (
          <option value="" disabled>
            {placeholder ?? 'Choose'}
          </option>
        )}
        {choices.map((choice) => (
          <option
            key={choice.value}
            value={choice.value}
            style={{ backgroundColor: colours.well, color: colours.ink0 }}
          >
            {choice.label}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}

/** The chevron at the right end, and the height of a line for the list that lies over the plate. */
function ArrowOverRoom() {
  return (
    <View style={{ flex: 1, minHeight: 24, alignItems: 'flex-end', justifyContent: 'center' }}>
      <Icon name="down" size={20} />
    </View>
  );
}
