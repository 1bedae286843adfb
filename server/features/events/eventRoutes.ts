import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { ProgressHub } from './startProgressHub';

export function eventRoutes(api: Api, hub: Pick<ProgressHub, 'join'>): void {
  api.registerEvents(endpoints.events, ({ actor, events }) => hub.join(actor.laboratoryId, events));
}
