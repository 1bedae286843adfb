import type { Aperture, ApertureBody } from '../../../shared/contracts/lots';
import { withConstraintProblems } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { found } from '../../http/ProblemError';
import { readApertures } from './apertureReadModel';
import { changeAperture } from './apertureRepository';

const serialTaken = {
  type: 'conflict',
  field: 'serial',
  message: 'Another aperture of the lot has this serial number. Serial numbers are unique within a lot.',
} as const;

export type ApertureService = ReturnType<typeof createApertureService>;

/** Single apertures; a lot takes them in. */
export function createApertureService(database: Database) {
  async function one(laboratory: LaboratoryScope, apertureId: string): Promise<Aperture> {
    const [aperture] = await readApertures(laboratory, { apertureId });
    return found(aperture, 'aperture');
  }
  return {
    list: (actor: Actor, search: string | undefined): Promise<Aperture[]> =>
      readApertures(scoped(database, actor.laboratoryId), { search }),

    get: (actor: Actor, apertureId: string): Promise<Aperture> => one(scoped(database, actor.laboratoryId), apertureId),

    change: (actor: Actor, apertureId: string, body: ApertureBody): Promise<Aperture> =>
      withConstraintProblems({ uq_aperture_serial: serialTaken }, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          await changeAperture(laboratory, apertureId, body);
          return one(laboratory, apertureId);
        }),
      ),
  };
}
