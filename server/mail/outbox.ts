import { randomUUID } from 'node:crypto';
import type { Transaction } from '../database/Database';
import { MailMessageEntity, type MailKind } from '../entities/MailMessageEntity';

export interface Mail {
  kind: MailKind;
  to: string;
  subject: string;
  text: string;
}

/** Writes a mail into the outbox, in the transaction of what causes it: both happen or neither. */
export async function postMail(transaction: Transaction, laboratoryId: string | null, mail: Mail): Promise<void> {
  await transaction.insert(MailMessageEntity, {
    id: randomUUID(),
    laboratoryId,
    kind: mail.kind,
    toAddress: mail.to,
    subject: mail.subject,
    bodyText: mail.text,
  });
}
