import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { LotService } from './lotService';
import { presentLotDetailTo, presentLotTo } from './presentLotTo';

export function lotRoutes(api: Api, lots: LotService): void {
  api.register(endpoints.lots, async ({ actor }) =>
    (await lots.list(actor)).map((lot) => presentLotTo(actor.role, lot)),
  );
  api.register(endpoints.lot, async ({ actor, params }) =>
    presentLotDetailTo(actor.role, await lots.get(actor, params.lotId)),
  );
  api.register(endpoints.createLot, ({ actor, body }) => lots.add(actor, body));
  api.register(endpoints.updateLot, ({ actor, params, body }) => lots.change(actor, params.lotId, body));
  api.register(endpoints.addApertures, ({ actor, params, body }) =>
    lots.addApertures(actor, params.lotId, body.apertures),
  );
}
