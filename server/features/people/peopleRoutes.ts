import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { RateLimits } from '../../http/rateLimits';
import type { RefreshCookie } from '../accounts/refreshCookie';
import type { InvitationService } from './invitationService';
import type { PeopleService } from './peopleService';
import { presentInvitation, presentPerson } from './presentPeople';

export interface PeopleRouteDependencies {
  people: PeopleService;
  invitations: InvitationService;
  cookie: RefreshCookie;
  limits: RateLimits;
}

/** The people of the laboratory and their invitations. */
export function peopleRoutes(api: Api, { people, invitations, cookie, limits }: PeopleRouteDependencies): void {
  api.register(endpoints.people, async ({ actor }) => (await people.list(actor)).map(presentPerson));
  api.register(endpoints.updatePerson, async ({ actor, params, body }) =>
    presentPerson(await people.update(actor, params.membershipId, body)),
  );
  api.register(endpoints.invitations, async ({ actor }) => (await invitations.list(actor)).map(presentInvitation));
  api.register(endpoints.invite, async ({ actor, body }) => presentInvitation(await invitations.invite(actor, body)));
  api.register(endpoints.withdrawInvitation, ({ actor, params }) => invitations.withdraw(actor, params.invitationId));
  api.registerOpen(endpoints.invitation, ({ params }) => invitations.offer(params.token), { before: limits.token });
  api.registerOpen(
    endpoints.acceptInvitation,
    async ({ body, response }) => {
      const { session, refreshToken } = await invitations.accept(body);
      cookie.set(response, refreshToken);
      return session;
    },
    { before: limits.token },
  );
}
