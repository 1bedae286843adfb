import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import { View } from 'react-native';
import type { z } from 'zod';
import { FormChoice } from '@/components/forms/FormChoice';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { roleMeaning, roleWords } from '@/components/ui/roleWords';
import { space } from '@/components/ui/tokens';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { inviteBody } from '@/shared/contracts/accounts';
import type { Client } from '@/shared/contracts/lots';
import { roles } from '@/shared/contracts/roles';

export interface InviteFormProps {
  clients: readonly Client[];
  onInvite: (body: z.output<typeof inviteBody>) => Promise<unknown>;
  onDone: (email: string) => void;
}

/** Invites a person by mail. */
export function InviteForm({ clients, onInvite, onDone }: InviteFormProps) {
  const form = useForm<z.input<typeof inviteBody>, unknown, z.output<typeof inviteBody>>({
    resolver: zodResolver(inviteBody),
    defaultValues: { email: '', role: 'technician', clientId: null },
  });
  const role = useWatch({ control: form.control, name: 'role' });
  const { submit, busy, problem } = useSubmit(
    form,
    (body) => onInvite(body).then(() => body.email),
    (email) => {
      form.reset();
      onDone(email);
    },
  );
  const send = () => {
    if (role !== 'client') form.setValue('clientId', null);
    submit();
  };
  return (
    <View role="form" aria-label="Invite a person" style={{ gap: space.hair }}>
      <FormField
        control={form.control}
        name="email"
        label="E-mail"
        keyboard="email-address"
        autoCapitalize="none"
        autoComplete="off"
        onSubmit={send}
      />
      <FormChoice
        control={form.control}
        name="role"
        label="Role"
        hint={`${roleMeaning[role].charAt(0).toUpperCase()}${roleMeaning[role].slice(1)}.`}
        choices={roles.map((one) => ({ value: one, label: roleWords[one] }))}
      />
      {role === 'client' ? (
        <FormChoice
          control={form.control}
          name="clientId"
          label="Of which client"
          placeholder={clients.length === 0 ? 'No client yet: add one with a lot' : 'Choose the client'}
          choices={clients.map((client) => ({ value: client.id, label: client.name }))}
        />
      ) : null}
      <Button
        label="Send the invitation"
        kind="primary"
        icon="mail"
        busy={busy}
        onPress={send}
        style={{ marginTop: space.s }}
      />
      {problem ? (
        <ProblemPlate title="No invitation is sent." problem={problem} kept="What you typed is kept." />
      ) : null}
    </View>
  );
}
