import type { Control, FieldPath, FieldValues } from 'react-hook-form';
import { FieldPair } from '@/components/forms/FieldPair';
import { FormChoice } from '@/components/forms/FormChoice';
import { FormField } from '@/components/forms/FormField';
import { FormNumber } from '@/components/forms/FormNumber';
import { kindChoices } from './apertureWords';

export interface ApertureFieldsProps<V extends FieldValues, O> {
  control: Control<V, unknown, O>;
  serialLabel: string;
  serialHint?: string;
}

/** What every piece has: serial, kind, nominal size, tolerance, note. */
export function ApertureFields<V extends FieldValues, O>({
  control,
  serialLabel,
  serialHint,
}: ApertureFieldsProps<V, O>) {
  const name = (field: string) => field as FieldPath<V>;
  return (
    <>
      <FieldPair>
        <FormField
          control={control}
          name={name('serial')}
          label={serialLabel}
          hint={serialHint}
          autoCapitalize="characters"
        />
        <FormChoice control={control} name={name('kind')} label="Kind" choices={kindChoices} />
      </FieldPair>
      <FieldPair>
        <FormNumber control={control} name={name('nominalSizeUm')} label="Nominal size" unit="µm" />
        <FormNumber
          control={control}
          name={name('toleranceUm')}
          label="Tolerance, either way"
          unit="µm"
          hint="Empty where none is agreed."
        />
      </FieldPair>
      <FormField control={control} name={name('note')} label="Note" lines={2} />
    </>
  );
}
