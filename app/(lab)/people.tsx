import { InviteForm } from '@/components/people/InviteForm';
import { PersonRow } from '@/components/people/PersonRow';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Plate } from '@/components/ui/Plate';
import { Row } from '@/components/ui/Row';
import { roleWords } from '@/components/ui/roleWords';
import { shortDate } from '@/components/ui/shortDate';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import { ApiProblem } from '@/hooks/api/ApiProblem';
import { useClients } from '@/hooks/queries/clients';
import { useInvitations, useInvite, usePeople, useUpdatePerson, useWithdrawInvitation } from '@/hooks/queries/people';
import { useRole, useSignedIn } from '@/hooks/session/SessionProvider';
import type { Role } from '@/shared/contracts/roles';

export default function PeopleScreen() {
  const { desk } = useLook();
  const manager = useRole() === 'manager';
  if (!manager) {
    return (
      <Screen title="People" back={desk ? undefined : '/more'}>
        <EmptyState sentence="People are kept by the managers of the laboratory." />
      </Screen>
    );
  }
  return <People />;
}

function People() {
  const { desk } = useLook();
  const { user } = useSignedIn();
  const people = usePeople();
  const clients = useClients();
  const invite = useInvite();
  const { say } = useNotice();
  const clientName = (clientId: string | null) => clients.data?.find((client) => client.id === clientId)?.name ?? null;
  return (
    <Screen
      title="People"
      back={desk ? undefined : '/more'}
      evidence={{
        title: 'Invite',
        width: 400,
        content: (
          <>
            <Plate>
              <InviteForm
                clients={clients.data ?? []}
                onInvite={(body) => invite.mutateAsync(body)}
                onDone={(email) => say(`An invitation is on its way to ${email}.`)}
              />
            </Plate>
            <Waiting clientName={clientName} />
          </>
        ),
      }}
    >
      <Awaited result={people} what="the people">
        {(list) => (
          <>
            {list.map((person) => (
              <Person
                key={person.membershipId}
                person={person}
                clientName={clientName(person.clientId)}
                self={person.userId === user.id}
              />
            ))}
          </>
        )}
      </Awaited>
    </Screen>
  );
}

interface PersonProps {
  person: { membershipId: string; name: string; email: string; role: Role; active: boolean };
  clientName: string | null;
  self: boolean;
}

function Person({ person, clientName, self }: PersonProps) {
  const update = useUpdatePerson(person.membershipId);
  return (
    <PersonRow
      name={person.name}
      email={person.email}
      role={person.role}
      active={person.active}
      clientName={clientName}
      self={self}
      busy={update.isPending}
      problem={update.error instanceof ApiProblem ? update.error : null}
      onChange={(change) => update.mutate(change)}
    />
  );
}

function Waiting({ clientName }: { clientName: (clientId: string | null) => string | null }) {
  const invitations = useInvitations();
  const withdraw = useWithdrawInvitation();
  const { say, warn } = useNotice();
  return (
    <Section title="Not yet taken up" flush>
      <Awaited
        result={invitations}
        what="the invitations"
        isEmpty={(list) => list.length === 0}
        whenEmpty={
          <Text tone="ink2" style={{ paddingHorizontal: 20, paddingBottom: 14 }}>
            No invitation is open.
          </Text>
        }
      >
        {(list) => (
          <>
            {list.map((one) => (
              <Row
                key={one.id}
                icon="mail"
                title={one.email}
                subtitle={`${clientName(one.clientId) ?? roleWords[one.role]}, until ${shortDate(one.expiresAt)}`}
                trailing={
                  <Button
                    label="Withdraw"
                    kind="quiet"
                    dense
                    busy={withdraw.isPending && withdraw.variables === one.id}
                    onPress={() =>
                      withdraw.mutate(one.id, {
                        onSuccess: () => say(`The invitation to ${one.email} is withdrawn.`),
                        onError: (error) => warn(`The invitation is not withdrawn. ${error.message}`),
                      })
                    }
                  />
                }
              />
            ))}
          </>
        )}
      </Awaited>
    </Section>
  );
}
