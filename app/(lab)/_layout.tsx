import { Redirect, Slot } from 'expo-router';
import { LabShell } from '@/components/ui/LabShell';
import { useOnline } from '@/hooks/api/useOnline';
import { useProgressEvents } from '@/hooks/events/useProgressEvents';
import { BenchChoiceProvider } from '@/hooks/queries/chosenBench';
import { useSession, useSignedIn } from '@/hooks/session/SessionProvider';
import { useAddress } from '@/hooks/session/useAddress';
import { usePlaces } from '@/hooks/session/usePlaces';
import { STAFF } from '@/shared/contracts/roles';

/** Everything behind the sign-in: who is not signed in is sent there and comes back to the same address. */
export default function LabLayout() {
  const { state } = useSession();
  const address = useAddress();
  if (state.status === 'signed-out') {
    const next = state.byHand || address === '/' ? '' : `?next=${encodeURIComponent(address)}`;
    return <Redirect href={`/sign-in${next}`} />;
  }
  if (state.status !== 'signed-in') return null;
  return (
    <BenchChoiceProvider key={state.session.membership.id}>
      <SignedIn />
    </BenchChoiceProvider>
  );
}

function SignedIn() {
  const { user, membership } = useSignedIn();
  const online = useOnline();
  const places = usePlaces();
  return (
    <LabShell places={places} online={online} userName={user.name}>
      {STAFF.includes(membership.role) ? <ProgressEvents /> : null}
      <Slot />
    </LabShell>
  );
}

/** Follows the laboratory's event stream, so that lists and sizes are read again as soon as they change. */
function ProgressEvents() {
  useProgressEvents();
  return null;
}
