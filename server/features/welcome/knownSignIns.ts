import type { Role } from '../../../shared/contracts/roles';
import type { Transaction } from '../../database/Database';

/** A person of the demo, whose password everybody may know. */
export interface DemoSignIn {
  role: Role;
  name: string;
  email: string;
  password: string;
}

/** Those of the demo's people who are there already: the demo may still be in the making. */
export async function knownSignIns(transaction: Transaction, signIns: readonly DemoSignIn[]): Promise<DemoSignIn[]> {
  const emails = signIns.map(({ email }) => email);
  const known: { email: string }[] = await transaction.query('select email from app_user where email = any($1)', [
    emails,
  ]);
  const there = new Set(known.map(({ email }) => email));
  return signIns.filter(({ email }) => there.has(email));
}
