import { endpoints } from '../../../shared/contracts/endpoints';
import type { Database } from '../../database/Database';
import type { Api } from '../../http/Api';
import { ProblemError } from '../../http/ProblemError';
import type { FakeInbox } from '../../mail/startFakeInbox';
import { knownSignIns, type DemoSignIn } from './knownSignIns';

export interface WelcomeRouteDependencies {
  database: Database;
  /** Sign-ins that the demo offers; empty outside of it. */
  demoSignIns: readonly DemoSignIn[];
  demo: boolean;
  inbox: FakeInbox | null;
}

/** What is open to anybody: the sign-in page's facts, the demo's inbox and the state of the service. */
export function welcomeRoutes(api: Api, { database, demoSignIns, demo, inbox }: WelcomeRouteDependencies): void {
  api.registerOpen(endpoints.welcome, async () => ({
    demo,
    signIns: demo ? await knownSignIns(database.manager, demoSignIns) : [],
    inbox: inbox !== null,
  }));
  api.registerOpen(endpoints.inbox, async () => {
    if (inbox === null) throw new ProblemError('not-found', 'There is no inbox here: mails go to their addresses.');
    return [...inbox.mails()];
  });
  api.registerOpen(endpoints.health, async ({ response }) => {
    const answers = await database.query('select 1').then(
      () => true,
      () => false,
    );
    if (!answers) response.status(503);
    return { ok: answers, database: answers };
  });
}
