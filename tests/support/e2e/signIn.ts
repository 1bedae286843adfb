import type { z } from 'zod';
import { accountEndpoints, type welcomeSchema } from '../../../shared/contracts/accounts';
import type { Role } from '../../../shared/contracts/roles';
import type { Visit } from './visit';
import { productUrls } from './visit';

/** The demo person of a role, as the sign-in page offers it. */
export async function demoPerson(role: Role): Promise<z.infer<typeof welcomeSchema>['signIns'][number]> {
  const answer = await fetch(`${productUrls().url}/api${accountEndpoints.welcome.path}`);
  const welcome = accountEndpoints.welcome.answer.parse(await answer.json());
  const person = welcome.signIns.find((each) => each.role === role);
  if (person === undefined) throw new Error(`The demo has no ${role}.`);
  return person;
}

/** Fills the sign-in form in, as a person would, and waits until the form is gone. */
export async function signIn({ page }: Visit, role: Role): Promise<void> {
  const person = await demoPerson(role);
  await page.getByLabel('Work e-mail').fill(person.email);
  await page.getByLabel('Password', { exact: true }).fill(person.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.getByLabel('Password', { exact: true }).waitFor({ state: 'detached' });
}
