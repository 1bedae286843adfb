import type { Control } from 'react-hook-form';
import type { z } from 'zod';
import { FieldPair } from '@/components/forms/FieldPair';
import { FormChoice } from '@/components/forms/FormChoice';
import { FormDay } from '@/components/forms/FormDay';
import { FormField } from '@/components/forms/FormField';
import type { Client, LotBody, lotBody } from '@/shared/contracts/lots';

export interface LotFieldsProps {
  control: Control<z.input<typeof lotBody>, unknown, LotBody>;
  clients: readonly Client[];
}

/** Number, client, order, due day and note of a lot. */
export function LotFields({ control, clients }: LotFieldsProps) {
  return (
    <>
      <FieldPair>
        <FormField control={control} name="number" label="Lot number" autoCapitalize="characters" />
        <FormDay control={control} name="dueOn" label="Due on" />
      </FieldPair>
      <FormChoice
        control={control}
        name="clientId"
        label="Client"
        placeholder={clients.length === 0 ? 'No client yet: add one below' : 'Choose the client'}
        choices={clients.map((client) => ({ value: client.id, label: client.name }))}
      />
      <FormField control={control} name="orderReference" label="Their order reference" autoCapitalize="characters" />
      <FormField control={control} name="note" label="Note" lines={3} />
    </>
  );
}
