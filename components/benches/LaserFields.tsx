import type { Control } from 'react-hook-form';
import type { z } from 'zod';
import { FieldPair } from '@/components/forms/FieldPair';
import { FormChoice } from '@/components/forms/FormChoice';
import { FormField } from '@/components/forms/FormField';
import { FormNumber } from '@/components/forms/FormNumber';
import { laserClasses, type LaserBody, type laserBody } from '@/shared/contracts/benches';

/** A laser's record. */
export function LaserFields({ control }: { control: Control<z.input<typeof laserBody>, unknown, LaserBody> }) {
  return (
    <>
      <FieldPair>
        <FormField control={control} name="name" label="Name" />
        <FormField control={control} name="serial" label="Serial" autoCapitalize="characters" />
      </FieldPair>
      <FieldPair>
        <FormNumber control={control} name="wavelengthNm" label="Wavelength in air" unit="nm" />
        <FormNumber control={control} name="wavelengthUncertaintyNm" label="Standard uncertainty (k = 1)" unit="nm" />
      </FieldPair>
      <FieldPair>
        <FormChoice
          control={control}
          name="laserClass"
          label="Class, as printed on its label"
          placeholder="Choose the class"
          choices={laserClasses.map((value) => ({ value, label: `Class ${value}` }))}
        />
        <FormNumber control={control} name="powerMw" label="Power" unit="mW" hint="Empty where it is not known." />
      </FieldPair>
      <FormField control={control} name="note" label="Note" lines={2} />
    </>
  );
}
