import { randomUUID } from 'node:crypto';
import type { Role } from '../../../shared/contracts/roles';
import type { Transaction } from '../../database/Database';
import { LaboratoryEntity } from '../../entities/LaboratoryEntity';
import { MembershipEntity } from '../../entities/MembershipEntity';
import { UserEntity } from '../../entities/UserEntity';

export interface User {
  id: string;
  name: string;
  email: string;
}
export interface UserWithPassword extends User {
  passwordHash: string;
}
/** An active membership of a person, with the laboratory's name. */
export interface Membership {
  id: string;
  laboratoryId: string;
  laboratoryName: string;
  role: Role;
  clientId: string | null;
}

const withPassword = { id: true, name: true, email: true, passwordHash: true } as const;

/*
 * People stand above the laboratories, so these few functions are not confined to one: they are for proving who
 * somebody is and for listing the laboratories that person belongs to.
 */

export async function findUserByEmail(transaction: Transaction, email: string): Promise<UserWithPassword | null> {
  const user = await transaction.findOne(UserEntity, { select: withPassword, where: { email } });
  return user && { ...user };
}

/**
 * Holds a person's row until the transaction ends. Whatever begins, renews or ends sessions does this first, so that a
 * token that is renewed at the same moment cannot outlive the session it belongs to.
 */
export async function lockUser(transaction: Transaction, userId: string): Promise<UserWithPassword | null> {
  const lock = { mode: 'pessimistic_write' } as const;
  const user = await transaction.findOne(UserEntity, { select: withPassword, where: { id: userId }, lock });
  return user && { ...user };
}

export async function addUser(transaction: Transaction, user: Omit<UserWithPassword, 'id'>): Promise<User> {
  const id = randomUUID();
  await transaction.insert(UserEntity, { id, ...user });
  return { id, name: user.name, email: user.email };
}

export async function renameUser(transaction: Transaction, userId: string, name: string): Promise<void> {
  await transaction.update(UserEntity, { id: userId }, { name });
}

export async function setPassword(transaction: Transaction, userId: string, passwordHash: string): Promise<void> {
  await transaction.update(UserEntity, { id: userId }, { passwordHash });
}

export async function addLaboratory(transaction: Transaction, name: string): Promise<string> {
  const id = randomUUID();
  await transaction.insert(LaboratoryEntity, { id, name });
  return id;
}

export async function addManager(transaction: Transaction, laboratoryId: string, userId: string): Promise<string> {
  const id = randomUUID();
  await transaction.insert(MembershipEntity, { id, laboratoryId, userId, role: 'manager', clientId: null });
  return id;
}

/** Active memberships of a person, oldest first. */
export async function activeMemberships(transaction: Transaction, userId: string): Promise<Membership[]> {
  return transaction.query(
    `select m.id, m.laboratory_id as "laboratoryId", l.name as "laboratoryName", m.role, m.client_id as "clientId"
       from membership m join laboratory l on l.id = m.laboratory_id
      where m.user_id = $1 and m.active
      order by m.created_at, m.id`,
    [userId],
  );
}
