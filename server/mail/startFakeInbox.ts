import { randomUUID } from 'node:crypto';
import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import type { z } from 'zod';
import type { inboxMailSchema } from '../../shared/contracts/accounts';

export type InboxMail = z.output<typeof inboxMailSchema>;

/** Stands in for a mail service in the demo and in tests: takes every mail, keeps it in memory, sends nothing on. */
export interface FakeInbox {
  smtpUrl: string;
  /** What has come in, newest first. */
  mails(): readonly InboxMail[];
  stop(): Promise<void>;
}

const MAX_MAILS = 200;
const MAX_MAIL_BYTES = 1024 * 1024;

/** Listens for SMTP on a free port of the loopback interface. */
export async function startFakeInbox(): Promise<FakeInbox> {
  const kept: InboxMail[] = [];
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: MAX_MAIL_BYTES,
    logger: false,
    onData(stream, session, done) {
      simpleParser(stream)
        .then((mail) => {
          const to = session.envelope.rcptTo.map(({ address }) => address).join(', ');
          const receivedAt = new Date().toISOString();
          kept.unshift({ id: randomUUID(), receivedAt, to, subject: mail.subject ?? '', text: mail.text ?? '' });
          kept.length = Math.min(kept.length, MAX_MAILS);
          done();
        })
        .catch((error: unknown) => done(error instanceof Error ? error : new Error(String(error))));
    },
  });
  server.listen(0, '127.0.0.1');
  await once(server.server, 'listening');
  const { port } = server.server.address() as AddressInfo;
  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    mails: () => kept,
    stop: () => new Promise((resolve) => server.close(resolve)),
  };
}
