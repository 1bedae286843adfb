import { zodResolver } from '@hookform/resolvers/zod';
import { router, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import { useNotice } from '@/components/ui/NoticeProvider';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { PublicPage } from '@/components/ui/PublicPage';
import { Text } from '@/components/ui/Text';
import { TwoWays } from '@/components/ui/TwoWays';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useResetPassword } from '@/hooks/queries/account';
import { resetBody } from '@/shared/contracts/accounts';

export default function ResetScreen() {
  const { token = '' } = useLocalSearchParams<{ token?: string }>();
  const { say } = useNotice();
  const reset = useResetPassword();
  const form = useForm({ resolver: zodResolver(resetBody), values: { token, password: '' } });
  const { submit, busy, problem } = useSubmit(
    form,
    (body) => reset.mutateAsync(body),
    () => {
      say('The new password is set. Sign in with it.');
      router.replace('/sign-in');
    },
  );
  return (
    <PublicPage
      title="New password"
      heading="Set a new password"
      low
      foot={<TwoWays ways={[{ label: 'Back to sign-in', icon: 'back', href: '/sign-in' }]} />}
    >
      {token === '' ? (
        <View style={{ gap: 12 }}>
          <Text>This address lacks the token of the mail. Open the link in the mail, or ask for a new one.</Text>
          <Button label="Ask for a new link" icon="mail" href="/forgot" />
        </View>
      ) : (
        <View role="form" aria-label="Set a new password" style={{ gap: 2 }}>
          <FormField
            control={form.control}
            name="password"
            label="New password"
            secret
            autoComplete="new-password"
            autoCapitalize="none"
            hint="At least 10 characters. Every session elsewhere ends."
            onSubmit={submit}
          />
          <Button label="Set the password" kind="primary" busy={busy} onPress={submit} style={{ marginTop: 8 }} />
        </View>
      )}
      {problem ? (
        <View style={{ gap: 2, marginTop: 10 }}>
          <ProblemPlate title="The password is not changed." problem={problem} />
          <Button label="Ask for a new link" icon="mail" href="/forgot" />
        </View>
      ) : null}
    </PublicPage>
  );
}
