import { Row } from '@/components/ui/Row';
import { roleWords } from '@/components/ui/roleWords';
import { Screen } from '@/components/ui/Screen';
import { ThemeSwitch } from '@/components/ui/ThemeSwitch';
import { useWelcome } from '@/hooks/queries/account';
import { useSignedIn } from '@/hooks/session/SessionProvider';

/** What is not daily work: people, mail, account, theme. */
export default function MoreScreen() {
  const { user, membership } = useSignedIn();
  const welcome = useWelcome();
  return (
    <Screen
      title={membership.laboratoryName}
      subtitle={`${user.name}, ${roleWords[membership.role].toLowerCase()}`}
      back="/"
    >
      {membership.role === 'manager' ? (
        <Row icon="people" title="People" subtitle="Invite, change roles, end access" href="/people" />
      ) : null}
      {welcome.data?.inbox ? (
        <Row icon="mail" title="Mail of the demo" subtitle="Caught on this machine, sent nowhere" href="/inbox" />
      ) : null}
      <Row icon="lock" title="Account" subtitle="Name, password, laboratory, sign out" href="/account" />
      <ThemeSwitch />
    </Screen>
  );
}
