import { zodResolver } from '@hookform/resolvers/zod';
import { router, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import { FormField } from '@/components/forms/FormField';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { PublicPage } from '@/components/ui/PublicPage';
import { roleWords } from '@/components/ui/roleWords';
import { Text } from '@/components/ui/Text';
import { TwoWays } from '@/components/ui/TwoWays';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useInvitation } from '@/hooks/queries/account';
import { useSession } from '@/hooks/session/SessionProvider';
import { acceptBody } from '@/shared/contracts/accounts';
import type { Role } from '@/shared/contracts/roles';

export default function InvitationScreen() {
  const { token = '' } = useLocalSearchParams<{ token?: string }>();
  const invitation = useInvitation(token);
  return (
    <PublicPage
      title="Invitation"
      heading="Invitation"
      low
      foot={<TwoWays ways={[{ label: 'Back to sign-in', icon: 'back', href: '/sign-in' }]} />}
    >
      {token === '' ? (
        <Text>This address lacks the token of the mail. Open the link in the mail.</Text>
      ) : (
        <Awaited result={invitation} what="the invitation">
          {(offer) => <Accept token={token} offer={offer} />}
        </Awaited>
      )}
    </PublicPage>
  );
}

interface AcceptProps {
  token: string;
  offer: { laboratoryName: string; email: string; role: Role; knownPerson: boolean };
}

function Accept({ token, offer }: AcceptProps) {
  const { actions } = useSession();
  const form = useForm({
    resolver: zodResolver(acceptBody),
    // A known person keeps the name they have; the service does not read this one.
    defaultValues: { token, name: offer.knownPerson ? offer.email.slice(0, 80) : '', password: '' },
  });
  const { submit, busy, problem } = useSubmit(form, actions.accept, () => router.replace('/'));
  return (
    <View style={{ gap: 2 }}>
      <Text style={{ paddingBottom: 16 }}>
        {`${offer.laboratoryName} invites ${offer.email} to work with it as ${roleWords[offer.role].toLowerCase()}.`}
      </Text>
      <View role="form" aria-label="Take up the invitation" style={{ gap: 2 }}>
        {offer.knownPerson ? null : (
          <FormField control={form.control} name="name" label="Your name" autoComplete="name" autoCapitalize="words" />
        )}
        <FormField
          control={form.control}
          name="password"
          label={offer.knownPerson ? 'The password you already have' : 'Password'}
          secret
          autoComplete={offer.knownPerson ? 'current-password' : 'new-password'}
          autoCapitalize="none"
          hint={offer.knownPerson ? 'This address already has an account.' : 'At least 10 characters.'}
          onSubmit={submit}
        />
        <Button label="Take up the invitation" kind="primary" busy={busy} onPress={submit} style={{ marginTop: 8 }} />
      </View>
      {problem ? <ProblemPlate title="The invitation is not taken up." problem={problem} /> : null}
    </View>
  );
}
