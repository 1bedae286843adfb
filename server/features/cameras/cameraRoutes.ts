import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { CameraService } from './cameraService';
import { presentCamera } from './presentCamera';

export function cameraRoutes(api: Api, cameras: CameraService): void {
  api.register(endpoints.cameras, async ({ actor }) => (await cameras.list(actor)).map(presentCamera));
  api.register(endpoints.createCamera, async ({ actor, body }) => presentCamera(await cameras.add(actor, body)));
  api.register(endpoints.updateCamera, async ({ actor, params, body }) =>
    presentCamera(await cameras.change(actor, params.cameraId, body)),
  );
}
