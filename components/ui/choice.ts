export interface Choice<V extends string> {
  value: V;
  label: string;
}

export interface ChoiceFieldProps<V extends string> {
  label: string;
  /** Null or a value that is not among the choices: nothing chosen yet. */
  value: V | null;
  choices: readonly Choice<V>[];
  onChange: (value: V) => void;
  onBlur?: () => void;
  /** Shown while nothing is chosen. */
  placeholder?: string;
  error?: string;
  hint?: string;
  disabled?: boolean;
  testID?: string;
}
