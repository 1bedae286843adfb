import { endpoints } from '../../../shared/contracts/endpoints';
import type { Session } from '../../../shared/contracts/accounts';
import type { Role } from '../../../shared/contracts/roles';
import { call, refreshTokenOf } from './call';
import type { TestApp } from './startTestApp';

export const password = 'a good long password';

export interface SignedIn {
  token: string;
  refreshToken: string;
  session: Session;
  email: string;
}

let count = 0;
/** An address that no other test of this process uses. */
export const newEmail = (): string => `person${(count += 1)}@laboratory.example`;

function signedIn(email: string, response: { body: unknown; headers: Record<string, unknown> }): SignedIn {
  const session = response.body as Session;
  return { email, session, token: session.accessToken, refreshToken: refreshTokenOf(response) };
}

/** Registers a laboratory; its manager is signed in. */
export async function registerLaboratory(app: TestApp, laboratoryName = 'Aperture room'): Promise<SignedIn> {
  const email = newEmail();
  const body = { laboratoryName, name: 'Mara Manager', email, password };
  return signedIn(email, await call(app, endpoints.register, { body }).expect(201));
}

export async function signIn(app: TestApp, email: string, secret = password): Promise<SignedIn> {
  return signedIn(email, await call(app, endpoints.signIn, { body: { email, password: secret } }).expect(200));
}

/** The text of the newest mail to an address that has not been sent yet. */
export async function newestMail(
  app: TestApp,
  email: string,
): Promise<{ subject: string; text: string; kind: string }> {
  const rows: { subject: string; text: string; kind: string }[] = await app.database.query(
    `select subject, body_text as text, kind from mail_message where to_address = $1
      order by created_at desc, id limit 1`,
    [email],
  );
  if (rows[0] === undefined) throw new Error(`no mail to ${email}`);
  return rows[0];
}

/** The secret in the link of a mail. */
export function tokenOf(mail: { text: string }): string {
  const token = /[?&]token=([\w-]+)/.exec(mail.text)?.[1];
  if (token === undefined) throw new Error(`no link in: ${mail.text}`);
  return token;
}

/** Invites a person and takes the invitation up. */
export async function join(
  app: TestApp,
  manager: SignedIn,
  role: Role,
  clientId: string | null = null,
): Promise<SignedIn> {
  const email = newEmail();
  await call(app, endpoints.invite, { token: manager.token, body: { email, role, clientId } }).expect(201);
  const token = tokenOf(await newestMail(app, email));
  const body = { token, name: `Tess ${role}`, password };
  return signedIn(email, await call(app, endpoints.acceptInvitation, { body }).expect(200));
}
