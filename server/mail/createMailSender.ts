import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';
import type { Database } from '../database/Database';
import { claimDueMail, markFailed, markSent, type ClaimedMail } from './mailQueries';

const MINUTE_MS = 60_000;
/** How often the outbox is looked at, ms. */
const POLL_MS = 1000;
/** A sender that has not reported back after this is taken for dead, ms; longer than all SMTP time limits together. */
const CLAIM_MS = 5 * MINUTE_MS;
const SMTP_WAIT_MS = 20_000;
/** After so many failed attempts, about two hours, a mail is given up. */
export const MAX_ATTEMPTS = 8;

export interface MailSenderDependencies {
  database: Database;
  smtpUrl: string;
  /** Sender's address with or without a name. */
  from: string;
  log: Logger;
  now?: () => Date;
}

export interface MailSender {
  /** Sends what is due now and returns how many mails it tried. */
  sendDue(): Promise<number>;
  /** Looks at the outbox from now on, again and again. */
  start(): void;
  /** Lets the mail at hand go out, then stops. */
  stop(): Promise<void>;
}

/** Waiting time after the n-th failed attempt, ms: 1, 2, 4 … minutes, at most an hour. */
export const backOffMs = (attempts: number): number => Math.min(2 ** (attempts - 1), 60) * MINUTE_MS;

/**
 * Sends the outbox by SMTP (RFC 5321). What the receiving side refuses for good (5xx) is given up at once, everything
 * else is tried again with growing pauses. A mail is sent at least once: if a sender dies between sending and noting
 * it, the mail goes out again under the same Message-ID.
 */
export function createMailSender({ database, smtpUrl, from, log, now = () => new Date() }: MailSenderDependencies) {
  const transport = createTransport(
    {
      url: smtpUrl,
      connectionTimeout: SMTP_WAIT_MS,
      greetingTimeout: SMTP_WAIT_MS,
      socketTimeout: SMTP_WAIT_MS,
      disableFileAccess: true,
      disableUrlAccess: true,
    },
    { from },
  );
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let round: Promise<void> = Promise.resolve();
  const domain = /@([^>\s]+)/.exec(from)?.[1] ?? 'localhost';

  async function send(mail: ClaimedMail): Promise<void> {
    try {
      await transport.sendMail({
        messageId: `<${mail.id}@${domain}>`,
        to: mail.to,
        subject: mail.subject,
        text: mail.text,
      });
    } catch (error) {
      const last = mail.attempts >= MAX_ATTEMPTS || isPermanent(error);
      const nextAt = last ? null : new Date(now().getTime() + backOffMs(mail.attempts));
      log.warn({ mailId: mail.id, attempts: mail.attempts, nextAt, err: error }, 'mail not sent');
      await markFailed(database, mail.id, error instanceof Error ? error.message : String(error), nextAt);
      return;
    }
    await markSent(database, mail.id, now());
    log.info({ mailId: mail.id }, 'mail sent');
  }

  async function sendDue(): Promise<number> {
    let tried = 0;
    while (!stopped) {
      const at = now();
      const mail = await claimDueMail(database, at, new Date(at.getTime() + CLAIM_MS));
      if (mail === null) break;
      await send(mail);
      tried += 1;
    }
    return tried;
  }

  const turn = (): void => {
    round = sendDue()
      .then(() => undefined)
      .catch((error: unknown) => log.error({ err: error }, 'the outbox could not be read'))
      .finally(() => {
        if (!stopped) timer = setTimeout(turn, POLL_MS);
      });
  };

  const sender: MailSender = {
    sendDue,
    start: turn,
    async stop() {
      stopped = true;
      clearTimeout(timer);
      await round;
      transport.close();
    },
  };
  return sender;
}

/** A reply 5xx of SMTP: the receiving side will not take this mail, however often it is sent. */
function isPermanent(error: unknown): boolean {
  const code = error instanceof Error && 'responseCode' in error ? Number(error.responseCode) : 0;
  return code >= 500 && code < 600;
}
