import type { CameraBody } from '../../../shared/contracts/benches';
import { withConstraintProblems } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import type { CameraEntity } from '../../entities/CameraEntity';
import type { Actor } from '../../http/Actor';
import { found } from '../../http/ProblemError';
import { addCamera, changeCamera, readCamera, readCameras } from './cameraRepository';

const problems = {
  uq_camera_name: {
    type: 'conflict',
    field: 'name',
    message: 'Another camera of the laboratory has this name. Choose another, for example with the serial number.',
  },
} as const;

export type CameraService = ReturnType<typeof createCameraService>;

/** The laboratory's cameras. A change does not reach measurements: each keeps the values that it used. */
export function createCameraService(database: Database) {
  return {
    list: (actor: Actor): Promise<CameraEntity[]> => readCameras(scoped(database, actor.laboratoryId)),

    add: (actor: Actor, body: CameraBody): Promise<CameraEntity> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) =>
          found(await readCamera(laboratory, await addCamera(laboratory, body)), 'camera'),
        ),
      ),

    change: (actor: Actor, cameraId: string, body: CameraBody): Promise<CameraEntity> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          await changeCamera(laboratory, cameraId, body);
          return found(await readCamera(laboratory, cameraId), 'camera');
        }),
      ),
  };
}
