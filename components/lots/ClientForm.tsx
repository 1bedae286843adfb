import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import type { ShownProblem } from '@/components/ui/ProblemPlate';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { space } from '@/components/ui/tokens';
import { clientBody, type ClientBody } from '@/shared/contracts/lots';

export interface ClientFormProps {
  busy: boolean;
  problem: ShownProblem | null;
  onSave: (body: ClientBody) => void;
  onCancel: () => void;
}

/** A new client, without leaving the lot that it is for. */
export function ClientForm({ busy, problem, onSave, onCancel }: ClientFormProps) {
  const form = useForm({ resolver: zodResolver(clientBody), defaultValues: { name: '', address: '' } });
  return (
    <View role="form" aria-label="New client" style={{ gap: space.hair }}>
      <FormField control={form.control} name="name" label="Name of the client" autoCapitalize="words" />
      <FormField control={form.control} name="address" label="Address" lines={2} />
      <View style={{ flexDirection: 'row', gap: space.hair }}>
        <Button label="Add this client" icon="plus" busy={busy} onPress={() => void form.handleSubmit(onSave)()} />
        <Button label="Leave it" kind="quiet" onPress={onCancel} />
      </View>
      {problem ? (
        <ProblemPlate title="The client is not added." problem={problem} kept="What you typed is kept." />
      ) : null}
    </View>
  );
}
