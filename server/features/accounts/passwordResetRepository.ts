import { randomUUID } from 'node:crypto';
import { IsNull } from 'typeorm';
import type { Transaction } from '../../database/Database';
import { PasswordResetEntity } from '../../entities/PasswordResetEntity';

export interface NewPasswordReset {
  userId: string;
  tokenHash: string;
  createdAt: Date;
  expiresAt: Date;
}

export async function addPasswordReset(transaction: Transaction, reset: NewPasswordReset): Promise<void> {
  await transaction.insert(PasswordResetEntity, { id: randomUUID(), ...reset });
}

/** The person whom an unused, unended token lets set a new password, or null. Holds the row. */
export async function holderOfReset(transaction: Transaction, tokenHash: string, at: Date): Promise<string | null> {
  const row = await transaction.findOne(PasswordResetEntity, {
    where: { tokenHash, usedAt: IsNull() },
    lock: { mode: 'pessimistic_write' },
  });
  return row !== null && row.expiresAt > at ? row.userId : null;
}

/** Marks every open reset of a person as used. */
export async function useResets(transaction: Transaction, userId: string, usedAt: Date): Promise<void> {
  await transaction.update(PasswordResetEntity, { userId, usedAt: IsNull() }, { usedAt });
}
