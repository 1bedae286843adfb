import { useState } from 'react';
import { AccountForms } from '@/components/people/AccountForms';
import { Button } from '@/components/ui/Button';
import { useNotice } from '@/components/ui/NoticeProvider';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { Row } from '@/components/ui/Row';
import { roleWords } from '@/components/ui/roleWords';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { ThemeSwitch } from '@/components/ui/ThemeSwitch';
import { useLook } from '@/components/ui/useLook';
import { ApiProblem } from '@/hooks/api/ApiProblem';
import { useChangePassword, useUpdateAccount, useWelcome } from '@/hooks/queries/account';
import { useSession, useSignedIn } from '@/hooks/session/SessionProvider';

export default function AccountScreen() {
  const { desk } = useLook();
  const { user, membership, memberships } = useSignedIn();
  const { actions } = useSession();
  const { say } = useNotice();
  const welcome = useWelcome();
  const rename = useUpdateAccount();
  const changePassword = useChangePassword();
  const [busy, setBusy] = useState<string | null>(null);
  const [problem, setProblem] = useState<ApiProblem | null>(null);

  const run = (what: string, task: () => Promise<void>) => {
    setBusy(what);
    setProblem(null);
    task()
      .catch((error: unknown) => {
        if (!(error instanceof ApiProblem)) throw error;
        setProblem(error);
      })
      .finally(() => setBusy(null));
  };
  return (
    <Screen
      title="Account"
      subtitle={desk ? user.email : `${user.name}, ${user.email}`}
      back={desk ? undefined : '/more'}
      measure={720}
      evidence={{
        title: 'On this device',
        width: 380,
        content: (
          <>
            <ThemeSwitch />
            {welcome.data?.inbox ? (
              <Row icon="mail" title="Mail of the demo" subtitle="Caught on this machine, sent nowhere" href="/inbox" />
            ) : null}
            <Button
              label="Sign out"
              icon="lock"
              busy={busy === 'sign-out'}
              onPress={() => run('sign-out', actions.signOut)}
              testID="sign-out"
            />
            {problem ? <ProblemPlate title="That did not work." problem={problem} /> : null}
          </>
        ),
      }}
    >
      <AccountForms
        name={user.name}
        onRename={(body) => rename.mutateAsync(body)}
        onRenamed={() => say('Your name is saved.')}
        onChangePassword={(body) => changePassword.mutateAsync(body)}
        onPasswordChanged={() => say('The new password is set. Every other session has ended.')}
      />
      <Section title="Laboratories" flush>
        {memberships.map((one) => (
          <Row
            key={one.id}
            icon="lots"
            title={one.laboratoryName}
            aside={roleWords[one.role].toLowerCase()}
            selected={one.id === membership.id}
            subtitle={
              one.id === membership.id ? 'You work here now' : busy === one.id ? 'Changing over …' : 'Go on here'
            }
            onPress={
              one.id === membership.id ? undefined : () => run(one.id, () => actions.switchLaboratory(one.laboratoryId))
            }
          />
        ))}
      </Section>
    </Screen>
  );
}
