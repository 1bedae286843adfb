import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { ClientService } from './clientService';
import { presentClient } from './presentClient';

export function clientRoutes(api: Api, clients: ClientService): void {
  api.register(endpoints.clients, async ({ actor }) => (await clients.list(actor)).map(presentClient));
  api.register(endpoints.createClient, async ({ actor, body }) => presentClient(await clients.add(actor, body)));
  api.register(endpoints.updateClient, async ({ actor, params, body }) =>
    presentClient(await clients.change(actor, params.clientId, body)),
  );
}
