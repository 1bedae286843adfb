import { useId, useState, type ReactNode } from 'react';
import { TextInput, type TextInputProps } from 'react-native';
import { FieldFrame } from './FieldFrame';
import { fontFamily } from './tokens';
import { useLook } from './useLook';
import { webProps } from './webProps';

export interface FieldProps {
  label: string;
  value: string;
  onChange: (value: string) => void;
  onBlur?: () => void;
  /** What is wrong, in a sentence. */
  error?: string;
  /** Said below the field while nothing is wrong. */
  hint?: string;
  disabled?: boolean;
  secret?: boolean;
  /** At the right end, inside: an icon or a unit. */
  trailing?: ReactNode;
  autoComplete?: TextInputProps['autoComplete'];
  keyboard?: TextInputProps['keyboardType'];
  autoCapitalize?: TextInputProps['autoCapitalize'];
  autoFocus?: boolean;
  placeholder?: string;
  onSubmit?: () => void;
  /** Several lines of text. */
  lines?: number;
  testID?: string;
}

/** A sunk plate that takes text. */
export function Field({
  label,
  value,
  onChange,
  onBlur,
  error,
  hint,
  disabled,
  secret,
  trailing,
  autoComplete,
  keyboard,
  autoCapitalize = 'sentences',
  autoFocus,
  placeholder,
  onSubmit,
  lines = 1,
  testID,
}: FieldProps) {
  const { colours } = useLook();
  const id = useId();
  const [focused, setFocused] = useState(false);
  return (
    <FieldFrame id={id} label={label} error={error} hint={hint} focused={focused} trailing={trailing} tall={lines > 1}>
      <TextInput
        testID={testID}
        value={value}
        onChangeText={onChange}
        onFocus={() => setFocused(true)}
        onBlur={() => {
          setFocused(false);
          onBlur?.();
        }}
        onSubmitEditing={lines > 1 ? undefined : onSubmit}
        editable={!disabled}
        secureTextEntry={secret}
        autoComplete={autoComplete}
        keyboardType={keyboard}
        autoCapitalize={autoCapitalize}
        autoFocus={autoFocus}
        autoCorrect={false}
        placeholder={placeholder}
        placeholderTextColor={colours.ink2}
        multiline={lines > 1}
        numberOfLines={lines > 1 ? lines : undefined}
        aria-label={label}
        {...webProps({
          'aria-invalid': error ? true : undefined,
          'aria-describedby': error || hint ? `${id}-said` : undefined,
        })}
        style={{
          flex: 1,
          minWidth: 0,
          minHeight: lines > 1 ? lines * 24 : 24,
          padding: 0,
          margin: 0,
          color: disabled ? colours.ink2 : colours.ink0,
          fontFamily: fontFamily.text,
          fontSize: 17,
          lineHeight: 24,
          textAlignVertical: lines > 1 ? 'top' : 'center',
        }}
      />
    </FieldFrame>
  );
}
