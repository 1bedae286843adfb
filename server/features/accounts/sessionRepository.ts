import { randomUUID } from 'node:crypto';
import { IsNull, LessThan, Not, type FindOptionsWhere } from 'typeorm';
import type { Database, Transaction } from '../../database/Database';
import type { Actor } from '../../http/Actor';
import { RefreshSessionEntity } from '../../entities/RefreshSessionEntity';

export interface RefreshSession {
  id: string;
  familyId: string;
  userId: string;
  membershipId: string;
  spentAt: Date | null;
  revokedAt: Date | null;
  expiresAt: Date;
}
export interface NewRefreshSession {
  familyId: string;
  userId: string;
  membershipId: string;
  tokenHash: string;
  createdAt: Date;
  expiresAt: Date;
}

export async function findRefreshSession(transaction: Transaction, tokenHash: string): Promise<RefreshSession | null> {
  const row = await transaction.findOne(RefreshSessionEntity, { where: { tokenHash } });
  return row && { ...row };
}

export async function addRefreshSession(transaction: Transaction, session: NewRefreshSession): Promise<void> {
  await transaction.insert(RefreshSessionEntity, { id: randomUUID(), ...session });
}

/** Marks the tokens of a family that are not spent yet. */
export async function spendFamily(transaction: Transaction, familyId: string, spentAt: Date): Promise<void> {
  await transaction.update(RefreshSessionEntity, { familyId, spentAt: IsNull() }, { spentAt });
}

export async function spendRefreshSession(transaction: Transaction, id: string, spentAt: Date): Promise<void> {
  await transaction.update(RefreshSessionEntity, { id }, { spentAt });
}

/**
 * The membership that the newest token of a family stands for (another tab may have switched the laboratory), or null
 * when the family has been revoked.
 */
export async function membershipOfFamily(transaction: Transaction, familyId: string): Promise<string | null> {
  const row = await transaction.findOne(RefreshSessionEntity, {
    where: { familyId, revokedAt: IsNull() },
    order: { createdAt: 'DESC' },
  });
  return row && row.membershipId;
}

/** The membership that a person used last, if any. */
export async function lastUsedMembership(transaction: Transaction, userId: string): Promise<string | null> {
  const row = await transaction.findOne(RefreshSessionEntity, { where: { userId }, order: { createdAt: 'DESC' } });
  return row && row.membershipId;
}

/** Ends every session that matches: none of its tokens is taken any more. */
async function revoke(
  transaction: Transaction,
  where: FindOptionsWhere<RefreshSessionEntity>,
  revokedAt: Date,
): Promise<void> {
  await transaction.update(RefreshSessionEntity, { ...where, revokedAt: IsNull() }, { revokedAt });
}

export const revokeFamily = (transaction: Transaction, familyId: string, at: Date): Promise<void> =>
  revoke(transaction, { familyId }, at);

export const revokeUser = (transaction: Transaction, userId: string, at: Date): Promise<void> =>
  revoke(transaction, { userId }, at);

export const revokeMembership = (transaction: Transaction, membershipId: string, at: Date): Promise<void> =>
  revoke(transaction, { membershipId }, at);

export const revokeOtherFamilies = (
  transaction: Transaction,
  userId: string,
  ownFamilyId: string,
  at: Date,
): Promise<void> => revoke(transaction, { userId, familyId: Not(ownFamilyId) }, at);

/** Drops tokens of a person that ended by themselves before the given time. */
export async function forgetExpired(transaction: Transaction, userId: string, before: Date): Promise<void> {
  await transaction.delete(RefreshSessionEntity, { userId, expiresAt: LessThan(before) });
}

/** Whether a person still has the access that the token was given for: the membership, its role and the sign-in. */
export async function accessStands(database: Database, actor: Actor): Promise<boolean> {
  const rows: unknown[] = await database.query(
    `select from membership m
      where m.id = $1 and m.active and m.role = $2
        and exists (select from refresh_session s where s.family_id = $3 and s.revoked_at is null)`,
    [actor.membershipId, actor.role, actor.familyId],
  );
  return rows.length > 0;
}
