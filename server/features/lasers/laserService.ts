import type { LaserBody } from '../../../shared/contracts/benches';
import { withConstraintProblems } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import type { LaserEntity } from '../../entities/LaserEntity';
import type { Actor } from '../../http/Actor';
import { found } from '../../http/ProblemError';
import { addLaser, changeLaser, readLaser, readLasers } from './laserRepository';

const problems = {
  uq_laser_name: {
    type: 'conflict',
    field: 'name',
    message: 'Another laser of the laboratory has this name. Choose another, for example with the serial number.',
  },
} as const;

export type LaserService = ReturnType<typeof createLaserService>;

/** The laboratory's lasers. A change does not reach measurements: each keeps the values that it used. */
export function createLaserService(database: Database) {
  return {
    list: (actor: Actor): Promise<LaserEntity[]> => readLasers(scoped(database, actor.laboratoryId)),

    add: (actor: Actor, body: LaserBody): Promise<LaserEntity> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) =>
          found(await readLaser(laboratory, await addLaser(laboratory, body)), 'laser'),
        ),
      ),

    change: (actor: Actor, laserId: string, body: LaserBody): Promise<LaserEntity> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          await changeLaser(laboratory, laserId, body);
          return found(await readLaser(laboratory, laserId), 'laser');
        }),
      ),
  };
}
