import { zodResolver } from '@hookform/resolvers/zod';
import { Redirect } from 'expo-router';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { PublicPage } from '@/components/ui/PublicPage';
import { TwoWays } from '@/components/ui/TwoWays';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useSession } from '@/hooks/session/SessionProvider';
import { registerBody } from '@/shared/contracts/accounts';

export default function RegisterScreen() {
  const { state, actions } = useSession();
  const form = useForm({
    resolver: zodResolver(registerBody),
    defaultValues: { laboratoryName: '', name: '', email: '', password: '' },
  });
  const { submit, busy, problem } = useSubmit(form, actions.register, () => undefined);
  if (state.status === 'signed-in') return <Redirect href="/" />;
  return (
    <PublicPage
      title="Register a laboratory"
      heading="Register a laboratory"
      low
      foot={<TwoWays ways={[{ label: 'Back to sign-in', icon: 'back', href: '/sign-in' }]} />}
    >
      <View role="form" aria-label="Register a laboratory" style={{ gap: 2 }}>
        <FormField
          control={form.control}
          name="laboratoryName"
          label="Name of the laboratory"
          autoComplete="organization"
          autoCapitalize="words"
        />
        <FormField
          control={form.control}
          name="name"
          label="Your name"
          autoComplete="name"
          autoCapitalize="words"
          hint="You become its manager and can invite the others."
        />
        <FormField
          control={form.control}
          name="email"
          label="Work e-mail"
          autoComplete="email"
          keyboard="email-address"
          autoCapitalize="none"
        />
        <FormField
          control={form.control}
          name="password"
          label="Password"
          secret
          autoComplete="new-password"
          autoCapitalize="none"
          hint="At least 10 characters."
          onSubmit={submit}
        />
        <Button label="Register" kind="primary" busy={busy} onPress={submit} style={{ marginTop: 8 }} />
      </View>
      {problem ? (
        <ProblemPlate title="The laboratory is not registered." problem={problem} kept="What you typed is kept." />
      ) : null}
    </PublicPage>
  );
}
