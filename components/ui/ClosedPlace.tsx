import type { Role } from '@/shared/contracts/roles';
import { Button } from './Button';
import { EmptyState } from './EmptyState';
import { Screen } from './Screen';

/** Stands where a place would be that is not open to the role of the person signed in. */
export function ClosedPlace({ role }: { role: Role }) {
  const sentence =
    role === 'client'
      ? 'This page is for the people of the laboratory. What you have ordered stands under Lots.'
      : 'Technicians and managers take frames. What they have taken stands under Lots.';
  return (
    <Screen title="Not open to you">
      <EmptyState sentence={sentence} action={<Button label="To the lots" icon="lots" href="/lots" />} />
    </Screen>
  );
}
