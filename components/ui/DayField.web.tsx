import { useId, useState } from 'react';
import type { DayFieldProps } from './DayField';
import { FieldFrame } from './FieldFrame';
import { fontFamily } from './tokens';
import { useLook } from './useLook';

/** A calendar day, with the browser's own calendar. */
export function DayField({ label, value, onChange, onBlur, error, hint, testID }: DayFieldProps) {
  const { colours, theme } = useLook();
  const id = useId();
  const [focused, setFocused] = useState(false);
  return (
    <FieldFrame id={id} label={label} error={error} hint={hint} focused={focused}>
      <input
        type="date"
        data-testid={testID}
        aria-label={label}
        aria-invalid={error ? true : undefined}
        aria-describedby={error || hint ? `${id}-said` : undefined}
        value={value ?? ''}
        onChange={(event) => onChange(event.target.value === '' ? null : event.target.value)}
        onFocus={() => setFocused(true)}
        onBlur={() => {
          setFocused(false);
          onBlur?.();
        }}
        style={{
          flex: 1,
          minWidth: 0,
          height: 24,
          padding: 0,
          border: 0,
          backgroundColor: 'transparent',
          color: value === null ? colours.ink2 : colours.ink0,
          fontFamily: fontFamily.text,
          fontSize: 17,
          colorScheme: theme,
        }}
      />
    </FieldFrame>
  );
}
