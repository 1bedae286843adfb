import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field, type FieldProps } from '@/components/ui/Field';

export interface FormFieldProps<V extends FieldValues, O = V> extends Omit<
  FieldProps,
  'value' | 'onChange' | 'onBlur' | 'error'
> {
  control: Control<V, unknown, O>;
  name: FieldPath<V>;
}

/** A text field of a form. */
export function FormField<V extends FieldValues, O = V>({ control, name, ...props }: FormFieldProps<V, O>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <Field
          {...props}
          testID={props.testID ?? name}
          value={typeof field.value === 'string' ? field.value : ''}
          onChange={field.onChange}
          onBlur={field.onBlur}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
