import { Field } from './Field';

export interface DayFieldProps {
  label: string;
  /** `2026-03-04`; null: none. */
  value: string | null;
  onChange: (value: string | null) => void;
  onBlur?: () => void;
  error?: string;
  hint?: string;
  testID?: string;
}

/** A calendar day. */
export function DayField({ value, onChange, ...props }: DayFieldProps) {
  return (
    <Field
      {...props}
      value={value ?? ''}
      onChange={(text) => onChange(text.trim() === '' ? null : text.trim())}
      placeholder="2026-03-06"
      keyboard="numbers-and-punctuation"
    />
  );
}
