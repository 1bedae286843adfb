import type { ReactNode } from 'react';
import type { Role } from '@/shared/contracts/roles';
import { Button } from './Button';
import { EmptyState } from './EmptyState';
import { Screen } from './Screen';

export interface OpenToProps {
  roles: readonly Role[];
  /** Role of the person signed in. */
  role: Role;
  children: ReactNode;
}

/** A screen for some roles; the others read whom it is for. The server holds to the same roles by itself. */
export function OpenTo({ roles, role, children }: OpenToProps) {
  if (roles.includes(role)) return children;
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
