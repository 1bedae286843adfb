import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { ApertureService } from './apertureService';

export function apertureRoutes(api: Api, apertures: ApertureService): void {
  api.register(endpoints.apertures, ({ actor, query }) => apertures.list(actor, query.search));
  api.register(endpoints.aperture, ({ actor, params }) => apertures.get(actor, params.apertureId));
  api.register(endpoints.updateAperture, ({ actor, params, body }) => apertures.change(actor, params.apertureId, body));
}
