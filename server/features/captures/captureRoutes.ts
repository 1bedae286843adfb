import { endpoints } from '../../../shared/contracts/endpoints';
import type { Database } from '../../database/Database';
import type { Api } from '../../http/Api';
import { createFrameReader } from '../frames/createFrameReader';
import type { CaptureService } from './captureService';

export function captureRoutes(api: Api, database: Database, captures: CaptureService): void {
  api.register(endpoints.captures, ({ actor, query }) => captures.list(actor, query));
  api.register(endpoints.createCapture, ({ actor, body }) => captures.add(actor, body));
  api.register(endpoints.capture, ({ actor, params }) => captures.get(actor, params.captureId));
  api.register(endpoints.placeKnown, async ({ actor, params, body }) => ({
    missing: await captures.placeKnown(actor, params.captureId, body.files),
  }));
  api.registerUpload(
    endpoints.upload,
    createFrameReader(database, (laboratoryId, captureId) => captures.requireCapture(laboratoryId, captureId)),
    ({ actor, params, body, file }) => captures.receive(actor, params.captureId, body.kind, file),
  );
  api.register(endpoints.updatePlace, ({ actor, params, body }) =>
    captures.updatePlace(actor, params.captureId, params.captureFrameId, body),
  );
  api.register(endpoints.measureCapture, async ({ actor, params, body }) => ({
    queued: await captures.measure(actor, params.captureId, body),
  }));
}
