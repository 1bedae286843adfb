import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import type { ChoiceFieldProps } from '@/components/ui/choice';
import { ChoiceField } from '@/components/ui/ChoiceField';

export interface FormChoiceProps<V extends FieldValues, C extends string, O = V> extends Omit<
  ChoiceFieldProps<C>,
  'value' | 'onChange' | 'onBlur' | 'error'
> {
  control: Control<V, unknown, O>;
  name: FieldPath<V>;
}

/** A choice of a form. */
export function FormChoice<V extends FieldValues, C extends string, O = V>({
  control,
  name,
  ...props
}: FormChoiceProps<V, C, O>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <ChoiceField
          {...props}
          testID={props.testID ?? name}
          value={props.choices.find((choice) => choice.value === field.value)?.value ?? null}
          onChange={field.onChange}
          onBlur={field.onBlur}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
