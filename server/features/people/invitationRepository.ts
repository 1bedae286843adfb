import { IsNull, MoreThan } from 'typeorm';
import type { Role } from '../../../shared/contracts/roles';
import type { Transaction } from '../../database/Database';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { InvitationEntity } from '../../entities/InvitationEntity';
import { LaboratoryEntity } from '../../entities/LaboratoryEntity';

export interface Invitation {
  id: string;
  email: string;
  role: Role;
  clientId: string | null;
  /** Name of the manager. */
  invitedBy: string;
  createdAt: Date;
  expiresAt: Date;
}
export interface NewInvitation {
  email: string;
  role: Role;
  clientId: string | null;
  tokenHash: string;
  /** Key of the manager. */
  invitedBy: string;
  createdAt: Date;
  expiresAt: Date;
}
export interface OpenInvitation {
  id: string;
  laboratoryId: string;
  email: string;
  role: Role;
  clientId: string | null;
}

/** Invitations that can still be taken up, newest first. */
export const readOpenInvitations = (laboratory: LaboratoryScope, at: Date): Promise<Invitation[]> =>
  laboratory.query<Invitation>(
    `select i.id, i.email, i.role, i.client_id as "clientId", u.name as "invitedBy", i.created_at as "createdAt",
            i.expires_at as "expiresAt"
       from invitation i join app_user u on u.id = i.invited_by
      where i.laboratory_id = $1 and i.accepted_at is null and i.withdrawn_at is null and i.expires_at > $2
      order by i.created_at desc, i.id`,
    [at],
  );

export const addInvitation = (laboratory: LaboratoryScope, invitation: NewInvitation): Promise<string> =>
  laboratory.insert(InvitationEntity, invitation);

/** Withdraws one open invitation; returns whether there was one. */
export async function withdrawInvitation(laboratory: LaboratoryScope, id: string, at: Date): Promise<boolean> {
  const open = { id, acceptedAt: IsNull(), withdrawnAt: IsNull() };
  return (await laboratory.update(InvitationEntity, open, { withdrawnAt: at })) > 0;
}

/** Withdraws every open invitation of an address: only the newest counts. */
export async function withdrawInvitationsOf(laboratory: LaboratoryScope, email: string, at: Date): Promise<void> {
  const open = { email, acceptedAt: IsNull(), withdrawnAt: IsNull() };
  await laboratory.update(InvitationEntity, open, { withdrawnAt: at });
}

export async function acceptInvitation(laboratory: LaboratoryScope, id: string, at: Date): Promise<void> {
  await laboratory.update(InvitationEntity, { id }, { acceptedAt: at });
}

/**
 * The open invitation of a token, or null. Whoever holds the token may see it, so this is not confined to a
 * laboratory: it is what leads to one. With `lock` the row is held until the transaction ends.
 */
export async function findOpenInvitation(
  transaction: Transaction,
  tokenHash: string,
  at: Date,
  lock = false,
): Promise<OpenInvitation | null> {
  const row = await transaction.findOne(InvitationEntity, {
    where: { tokenHash, acceptedAt: IsNull(), withdrawnAt: IsNull(), expiresAt: MoreThan(at) },
    ...(lock && { lock: { mode: 'pessimistic_write' } }),
  });
  return row && { ...row };
}

export async function laboratoryName(transaction: Transaction, laboratoryId: string): Promise<string> {
  const row = await transaction.findOneByOrFail(LaboratoryEntity, { id: laboratoryId });
  return row.name;
}
