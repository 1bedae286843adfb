import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { LaserService } from './laserService';
import { presentLaser } from './presentLaser';

export function laserRoutes(api: Api, lasers: LaserService): void {
  api.register(endpoints.lasers, async ({ actor }) => (await lasers.list(actor)).map(presentLaser));
  api.register(endpoints.createLaser, async ({ actor, body }) => presentLaser(await lasers.add(actor, body)));
  api.register(endpoints.updateLaser, async ({ actor, params, body }) =>
    presentLaser(await lasers.change(actor, params.laserId, body)),
  );
}
