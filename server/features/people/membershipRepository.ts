import type { Role } from '../../../shared/contracts/roles';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { MembershipEntity } from '../../entities/MembershipEntity';

/** A person of the laboratory, with access or without. */
export interface Person {
  membershipId: string;
  userId: string;
  name: string;
  email: string;
  role: Role;
  clientId: string | null;
  active: boolean;
  createdAt: Date;
}

const personQuery = `
  select m.id as "membershipId", m.user_id as "userId", u.name, u.email, m.role, m.client_id as "clientId", m.active,
         m.created_at as "createdAt"
    from membership m join app_user u on u.id = m.user_id
   where m.laboratory_id = $1`;

/** People by name; those whose access has ended last. */
export const readPeople = (laboratory: LaboratoryScope): Promise<Person[]> =>
  laboratory.query<Person>(`${personQuery} order by m.active desc, lower(u.name), m.id`);

export async function readPerson(laboratory: LaboratoryScope, membershipId: string): Promise<Person | null> {
  const [person] = await laboratory.query<Person>(`${personQuery} and m.id = $2`, [membershipId]);
  return person ?? null;
}

export async function readPersonByEmail(laboratory: LaboratoryScope, email: string): Promise<Person | null> {
  const [person] = await laboratory.query<Person>(`${personQuery} and u.email = $2`, [email]);
  return person ?? null;
}

/** Keys of the active managers; their rows are held, so that two of them cannot end each other at once. */
export async function lockManagers(laboratory: LaboratoryScope): Promise<string[]> {
  const managers = await laboratory.find(MembershipEntity, {
    where: { role: 'manager', active: true },
    order: { id: 'ASC' },
    lock: 'update',
  });
  return managers.map(({ id }) => id);
}

export async function changeMembership(
  laboratory: LaboratoryScope,
  membershipId: string,
  change: Partial<Pick<Person, 'role' | 'active' | 'clientId'>>,
): Promise<void> {
  await laboratory.update(MembershipEntity, { id: membershipId }, change);
}

export const addMembership = (
  laboratory: LaboratoryScope,
  membership: Pick<Person, 'userId' | 'role' | 'clientId'>,
): Promise<string> => laboratory.insert(MembershipEntity, membership);
