import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { NumberField, type NumberFieldProps } from '@/components/ui/NumberField';

export interface FormNumberProps<V extends FieldValues, O = V> extends Omit<
  NumberFieldProps,
  'value' | 'onChange' | 'onBlur' | 'error'
> {
  control: Control<V, unknown, O>;
  name: FieldPath<V>;
}

/** A number field of a form; empty is null, what is no number is NaN, and the schema says which of them will do. */
export function FormNumber<V extends FieldValues, O = V>({ control, name, ...props }: FormNumberProps<V, O>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <NumberField
          {...props}
          testID={props.testID ?? name}
          value={typeof field.value === 'number' ? field.value : null}
          onChange={field.onChange}
          onBlur={field.onBlur}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
