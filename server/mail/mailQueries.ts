import type { Database } from '../database/Database';
import type { MailState } from '../entities/MailMessageEntity';

/** A mail that one sender has taken in hand. */
export interface ClaimedMail {
  id: string;
  to: string;
  subject: string;
  text: string;
  /** This attempt included. */
  attempts: number;
}

/**
 * Takes the mail that is due first, or null. Until `claimedUntil` no other sender takes it; if this one dies, the mail
 * is due again then. Many senders may run at once. `at` is whole milliseconds where the database keeps microseconds:
 * a mail written within the millisecond of `at` is due.
 */
export async function claimDueMail(database: Database, at: Date, claimedUntil: Date): Promise<ClaimedMail | null> {
  const [rows]: [ClaimedMail[], number] = await database.query(
    `update mail_message set attempts = attempts + 1, next_attempt_at = $2
      where id = (
        select id from mail_message where state = 'waiting' and next_attempt_at < $1::timestamptz + interval '1 millisecond'
         order by next_attempt_at, id limit 1 for update skip locked
      )
      returning id, to_address as "to", subject, body_text as text, attempts`,
    [at, claimedUntil],
  );
  return rows[0] ?? null;
}

/** Notes that a mail has gone out. Its text is dropped: it may hold a secret, and it has done its work. */
export async function markSent(database: Database, id: string, at: Date): Promise<void> {
  await database.query(
    `update mail_message set state = 'sent', sent_at = $2, body_text = '', last_error = null where id = $1`,
    [id, at],
  );
}

/** Notes why an attempt failed: to be tried again at a time, or given up (null), and then its text is dropped too. */
export async function markFailed(database: Database, id: string, error: string, nextAt: Date | null): Promise<void> {
  const state: MailState = nextAt === null ? 'failed' : 'waiting';
  await database.query(
    `update mail_message
        set state = $2, last_error = $3, next_attempt_at = coalesce($4, next_attempt_at),
            body_text = case when $2 = 'failed' then '' else body_text end
      where id = $1`,
    [id, state, error, nextAt],
  );
}
