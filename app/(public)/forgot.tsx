import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { PublicPage } from '@/components/ui/PublicPage';
import { Text } from '@/components/ui/Text';
import { TwoWays } from '@/components/ui/TwoWays';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useForgotPassword, useWelcome } from '@/hooks/queries/account';
import { forgotBody } from '@/shared/contracts/accounts';

export default function ForgotScreen() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const welcome = useWelcome();
  const forgot = useForgotPassword();
  const form = useForm({ resolver: zodResolver(forgotBody), defaultValues: { email: '' } });
  const { submit, busy, problem } = useSubmit(
    form,
    (body) => forgot.mutateAsync(body),
    () => setSentTo(form.getValues('email').trim()),
  );
  return (
    <PublicPage
      title="Forgotten password"
      heading="Forgotten password"
      low
      foot={<TwoWays ways={[{ label: 'Back to sign-in', icon: 'back', href: '/sign-in' }]} />}
    >
      {sentTo === null ? (
        <View role="form" aria-label="Forgotten password" style={{ gap: 2 }}>
          <FormField
            control={form.control}
            name="email"
            label="Work e-mail"
            autoComplete="email"
            keyboard="email-address"
            autoCapitalize="none"
            onSubmit={submit}
            hint="A mail with a link to set a new password goes there."
          />
          <Button label="Send the link" kind="primary" busy={busy} onPress={submit} style={{ marginTop: 8 }} />
        </View>
      ) : (
        <View style={{ gap: 12 }}>
          <Text
            live
          >{`If ${sentTo} is known here, a mail with a link is on its way. The link holds for a short time and once.`}</Text>
          <Button label="Use another address" icon="back" onPress={() => setSentTo(null)} />
          {welcome.data?.inbox ? <Button label="Open the demo’s mail" icon="mail" href="/inbox" /> : null}
        </View>
      )}
      {problem ? <ProblemPlate title="No mail was sent." problem={problem} /> : null}
    </PublicPage>
  );
}
