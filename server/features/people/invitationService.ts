import type { z } from 'zod';
import type { acceptBody, inviteBody } from '../../../shared/contracts/accounts';
import type { Role } from '../../../shared/contracts/roles';
import { withConstraintProblems } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { found, notFound, ProblemError } from '../../http/ProblemError';
import type { MailTexts } from '../../mail/mailTexts';
import { postMail } from '../../mail/outbox';
import { addUser, findUserByEmail, lockUser } from '../accounts/accountRepository';
import type { Passwords } from '../accounts/passwords';
import { hashSecret, newSecret } from '../accounts/secretTokens';
import type { OpenedSession, SessionService } from '../accounts/sessionService';
import {
  acceptInvitation,
  addInvitation,
  findOpenInvitation,
  laboratoryName,
  readOpenInvitations,
  withdrawInvitation,
  withdrawInvitationsOf,
  type Invitation,
} from './invitationRepository';
import { addMembership, changeMembership, readPersonByEmail } from './membershipRepository';

/** An invitation stays open for so long, days. */
export const INVITATION_DAYS = 14;
const DAY_MS = 86_400_000;

export interface InvitationDependencies {
  database: Database;
  sessions: SessionService;
  passwords: Passwords;
  mailTexts: MailTexts;
  now: () => Date;
}

/** What the holder of a token is offered. */
export interface Offer {
  laboratoryName: string;
  email: string;
  role: Role;
  /** The person has an account already and proves it by its password. */
  knownPerson: boolean;
}

export type InvitationService = ReturnType<typeof createInvitationService>;

const notOpen = (): ProblemError =>
  new ProblemError('not-found', 'This invitation has been used, withdrawn or is too old. Ask for a new one.');

/** Invitations: mailed, for one use, ended by time, by use or by a manager. */
export function createInvitationService(dependencies: InvitationDependencies) {
  const { database, sessions, passwords, mailTexts, now } = dependencies;
  return {
    list: (actor: Actor): Promise<Invitation[]> => readOpenInvitations(scoped(database, actor.laboratoryId), now()),

    /** Invites an address; an earlier invitation of it is withdrawn. */
    invite(actor: Actor, { email, role, clientId }: z.output<typeof inviteBody>): Promise<Invitation> {
      const noClient = { type: 'invalid', field: 'clientId', message: 'Choose a client of the laboratory.' } as const;
      return withConstraintProblems({ fk_invitation_client_id: noClient }, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory, transaction) => {
          const person = await readPersonByEmail(laboratory, email);
          if (person?.active) {
            const message = 'This person belongs to the laboratory already. Change the role among the people.';
            throw new ProblemError('conflict', message, { fields: { email: message } });
          }
          const manager = found(await lockUser(transaction, actor.userId), 'person');
          const createdAt = now();
          const expiresAt = new Date(createdAt.getTime() + INVITATION_DAYS * DAY_MS);
          const token = newSecret();
          await withdrawInvitationsOf(laboratory, email, createdAt);
          const invitation = { email, role, clientId, createdAt, expiresAt };
          const id = await addInvitation(laboratory, {
            ...invitation,
            tokenHash: hashSecret(token),
            invitedBy: actor.userId,
          });
          const name = await laboratoryName(transaction, actor.laboratoryId);
          const offer = {
            to: email,
            laboratoryName: name,
            invitedBy: manager.name,
            role,
            token,
            days: INVITATION_DAYS,
          };
          await postMail(transaction, actor.laboratoryId, mailTexts.invitation(offer));
          return { id, ...invitation, invitedBy: manager.name };
        }),
      );
    },

    async withdraw(actor: Actor, invitationId: string): Promise<void> {
      const laboratory = scoped(database, actor.laboratoryId);
      if (!(await withdrawInvitation(laboratory, invitationId, now()))) throw notFound('open invitation');
    },

    async offer(token: string): Promise<Offer> {
      const invitation = await findOpenInvitation(database.manager, hashSecret(token), now());
      if (invitation === null) throw notOpen();
      const known = await findUserByEmail(database.manager, invitation.email);
      const name = await laboratoryName(database.manager, invitation.laboratoryId);
      const { email, role } = invitation;
      return { laboratoryName: name, email, role, knownPerson: known !== null };
    },

    /**
     * Takes an invitation up. A new person gets an account with the given name and password; a known one proves
     * themselves by the password they have. Access that had ended comes back with the role of the invitation.
     */
    accept({ token, name, password }: z.output<typeof acceptBody>): Promise<OpenedSession> {
      return database.transaction(async (transaction) => {
        const at = now();
        const invitation = await findOpenInvitation(transaction, hashSecret(token), at, true);
        if (invitation === null) throw notOpen();
        const { email, role, clientId } = invitation;
        const known = await findUserByEmail(transaction, email);
        if (known !== null && !(await passwords.matches(password, known.passwordHash))) {
          const message = 'This is not the password of your account. Set a new one if you have forgotten it.';
          throw new ProblemError('invalid', message, { fields: { password: message } });
        }
        const user =
          known ?? (await addUser(transaction, { name, email, passwordHash: await passwords.hash(password) }));
        const laboratory = scoped(transaction, invitation.laboratoryId);
        const former = await readPersonByEmail(laboratory, email);
        if (former?.active) throw notOpen();
        if (former) await changeMembership(laboratory, former.membershipId, { role, clientId, active: true });
        const membershipId =
          former?.membershipId ?? (await addMembership(laboratory, { userId: user.id, role, clientId }));
        await acceptInvitation(laboratory, invitation.id, at);
        return sessions.open(transaction, user, membershipId);
      });
    },
  };
}
