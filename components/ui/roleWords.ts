import type { Role } from '@/shared/contracts/roles';

/** Roles as a person reads them. */
export const roleWords: Record<Role, string> = {
  technician: 'Technician',
  reviewer: 'Reviewer',
  manager: 'Manager',
  client: 'Client',
};

/** What a role may do, for those who give it. */
export const roleMeaning: Record<Role, string> = {
  technician: 'takes frames, measures, keeps lots',
  reviewer: 'sees and judges results, keeps lots',
  manager: 'does all of it; keeps benches and people',
  client: 'sees the lots of its own company only',
};
