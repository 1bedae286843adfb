import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import type { z } from 'zod';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { Section } from '@/components/ui/Section';
import { space } from '@/components/ui/tokens';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { accountEndpoints, changePasswordBody } from '@/shared/contracts/accounts';

export interface AccountFormsProps {
  name: string;
  onRename: (body: { name: string }) => Promise<unknown>;
  onRenamed: () => void;
  onChangePassword: (body: z.output<typeof changePasswordBody>) => Promise<unknown>;
  onPasswordChanged: () => void;
}

/** Own name and password. */
export function AccountForms({ name, onRename, onRenamed, onChangePassword, onPasswordChanged }: AccountFormsProps) {
  const nameForm = useForm({ resolver: zodResolver(accountEndpoints.updateAccount.body), defaultValues: { name } });
  const naming = useSubmit(nameForm, onRename, onRenamed);
  const passwordForm = useForm({
    resolver: zodResolver(changePasswordBody),
    defaultValues: { currentPassword: '', newPassword: '' },
  });
  const password = useSubmit(passwordForm, onChangePassword, () => {
    passwordForm.reset();
    onPasswordChanged();
  });
  return (
    <>
      <Section title="Name">
        <View role="form" aria-label="Name" style={{ gap: space.s }}>
          <FormField
            control={nameForm.control}
            name="name"
            label="Your name"
            autoComplete="name"
            autoCapitalize="words"
            onSubmit={naming.submit}
          />
          <View style={{ alignSelf: 'flex-start' }}>
            <Button label="Save the name" icon="tick" busy={naming.busy} onPress={naming.submit} />
          </View>
          {naming.problem ? <ProblemPlate title="The name is not saved." problem={naming.problem} /> : null}
        </View>
      </Section>
      <Section title="Password" note="Every session on other devices ends when it is changed.">
        <View role="form" aria-label="Password" style={{ gap: space.hair }}>
          <FormField
            control={passwordForm.control}
            name="currentPassword"
            label="Password now"
            secret
            autoComplete="current-password"
            autoCapitalize="none"
          />
          <FormField
            control={passwordForm.control}
            name="newPassword"
            label="New password"
            secret
            autoComplete="new-password"
            autoCapitalize="none"
            hint="At least 10 characters."
            onSubmit={password.submit}
          />
          <View style={{ alignSelf: 'flex-start', marginTop: space.s }}>
            <Button label="Change the password" icon="lock" busy={password.busy} onPress={password.submit} />
          </View>
          {password.problem ? <ProblemPlate title="The password is not changed." problem={password.problem} /> : null}
        </View>
      </Section>
    </>
  );
}
