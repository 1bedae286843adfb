import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { DayField } from '@/components/ui/DayField';

export interface FormDayProps<V extends FieldValues, O = V> {
  control: Control<V, unknown, O>;
  name: FieldPath<V>;
  label: string;
  hint?: string;
}

/** A calendar day of a form, or none. */
export function FormDay<V extends FieldValues, O = V>({ control, name, label, hint }: FormDayProps<V, O>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <DayField
          label={label}
          hint={hint}
          testID={name}
          value={typeof field.value === 'string' ? field.value : null}
          onChange={field.onChange}
          onBlur={field.onBlur}
          error={fieldState.error ? 'Enter the day as year, month and day, such as 2026-03-06.' : undefined}
        />
      )}
    />
  );
}
