import type { z } from 'zod';
import type { invitationSchema, personSchema } from '../../../shared/contracts/accounts';
import type { Invitation } from './invitationRepository';
import type { Person } from './membershipRepository';

export function presentPerson(person: Person): z.output<typeof personSchema> {
  return { ...person, createdAt: person.createdAt.toISOString() };
}

export function presentInvitation(invitation: Invitation): z.output<typeof invitationSchema> {
  return {
    ...invitation,
    createdAt: invitation.createdAt.toISOString(),
    expiresAt: invitation.expiresAt.toISOString(),
  };
}
