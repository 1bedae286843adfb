import { zodResolver } from '@hookform/resolvers/zod';
import { Redirect, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import { DemoSignIns } from '@/components/forms/DemoSignIns';
import { FormField } from '@/components/forms/FormField';
import { Button } from '@/components/ui/Button';
import { Icon } from '@/components/ui/Icon';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { PublicPage } from '@/components/ui/PublicPage';
import { TwoWays } from '@/components/ui/TwoWays';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useWelcome } from '@/hooks/queries/account';
import { useSession } from '@/hooks/session/SessionProvider';
import { localAddress } from '@/hooks/session/useAddress';
import { signInBody } from '@/shared/contracts/accounts';

export default function SignInScreen() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  const { state, actions } = useSession();
  const welcome = useWelcome();
  const form = useForm({ resolver: zodResolver(signInBody), defaultValues: { email: '', password: '' } });
  const { submit, busy, problem } = useSubmit(form, actions.signIn, () => undefined);

  if (state.status === 'signed-in') return <Redirect href={localAddress(next)} />;
  const fill = (email: string, password: string) => {
    form.setValue('email', email);
    form.setValue('password', password);
    submit();
  };
  return (
    <PublicPage
      title="Sign in"
      foot={
        <TwoWays
          ways={[
            { label: 'Forgotten password', icon: 'mail', href: '/forgot' },
            { label: 'Register a laboratory', icon: 'plus', href: '/register' },
          ]}
        />
      }
    >
      <View role="form" aria-label="Sign in" style={{ gap: 2 }}>
        <FormField
          control={form.control}
          name="email"
          label="Work e-mail"
          autoComplete="username"
          keyboard="email-address"
          autoCapitalize="none"
          onSubmit={submit}
        />
        <FormField
          control={form.control}
          name="password"
          label="Password"
          secret
          autoComplete="current-password"
          autoCapitalize="none"
          onSubmit={submit}
          trailing={<Icon name="lock" size={20} />}
        />
        <Button label="Sign in" kind="primary" busy={busy} onPress={submit} style={{ marginTop: 8 }} testID="sign-in" />
      </View>
      {problem ? (
        <View style={{ marginTop: 10 }}>
          <ProblemPlate
            title="You are not signed in."
            problem={problem.kind === 'not-signed-in' ? { message: problem.message } : problem}
          />
        </View>
      ) : null}
      {welcome.data?.demo ? (
        <DemoSignIns signIns={welcome.data.signIns} inbox={welcome.data.inbox} onChoose={fill} />
      ) : null}
    </PublicPage>
  );
}
