import type { Role } from '../../shared/contracts/roles';
import type { Mail } from './outbox';

const roleWords: Record<Role, string> = {
  technician: 'a technician',
  reviewer: 'a reviewer',
  manager: 'a manager',
  client: 'a client',
};

interface InvitationMail {
  to: string;
  laboratoryName: string;
  invitedBy: string;
  role: Role;
  token: string;
  /** Days that the invitation stays open. */
  days: number;
}

/** The mails that the service sends: plain text, links built from the public address. */
export function createMailTexts(publicUrl: string) {
  const link = (path: string, token: string) => `${publicUrl}/${path}?token=${encodeURIComponent(token)}`;
  return {
    invitation({ to, laboratoryName, invitedBy, role, token, days }: InvitationMail): Mail {
      return {
        kind: 'invitation',
        to,
        subject: `Invitation to ${laboratoryName} on Ringwright`,
        text: [
          'Hello,',
          '',
          `${invitedBy} invites you to join ${laboratoryName} on Ringwright as ${roleWords[role]}.`,
          '',
          'Open this link to accept:',
          link('invitation', token),
          '',
          `The link works once, within ${days} days. If you did not expect this mail, you can ignore it.`,
          '',
        ].join('\n'),
      };
    },

    passwordReset(to: string, name: string, token: string, minutes: number): Mail {
      return {
        kind: 'password-reset',
        to,
        subject: 'Set a new password for Ringwright',
        text: [
          `Hello ${name},`,
          '',
          'somebody, probably you, asked to set a new password for this address.',
          '',
          'Open this link to set it:',
          link('reset', token),
          '',
          `The link works once, within ${minutes} minutes. If it was not you, ignore this mail: nothing has changed.`,
          '',
        ].join('\n'),
      };
    },

    passwordChanged(to: string, name: string): Mail {
      return {
        kind: 'password-changed',
        to,
        subject: 'Your password for Ringwright was changed',
        text: [
          `Hello ${name},`,
          '',
          'the password of your account was changed, and your other sessions have been ended.',
          '',
          'If it was not you, set a new password at once:',
          `${publicUrl}/forgot`,
          'and tell a manager of your laboratory.',
          '',
        ].join('\n'),
      };
    },
  };
}

export type MailTexts = ReturnType<typeof createMailTexts>;
