import { Field, type FieldProps } from './Field';

/** A field for several lines. */
export function TextArea({ lines = 3, ...props }: FieldProps) {
  return <Field {...props} lines={lines} />;
}
