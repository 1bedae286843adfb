import type { ApertureBody, Lot, LotBody, LotDetail } from '../../../shared/contracts/lots';
import { withConstraintProblems, type ConstraintProblem } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { found, notFound, ProblemError } from '../../http/ProblemError';
import { readApertures } from '../apertures/apertureReadModel';
import { addApertures, serialsOfLot } from '../apertures/apertureRepository';
import { readLots } from './lotReadModel';
import { addLot, changeLot, lockLot } from './lotRepository';
import { ownClient } from './ownClient';

const problems: Record<string, ConstraintProblem> = {
  uq_lot_number: {
    type: 'conflict',
    field: 'number',
    message: 'Another lot of the laboratory has this number. Choose another, or add the apertures to that lot.',
  },
  fk_lot_client_id: { type: 'invalid', field: 'clientId', message: 'Choose a client of the laboratory.' },
};

export type LotService = ReturnType<typeof createLotService>;

/** Lots and the apertures that arrive with them. A person of a client reaches that client's lots only. */
export function createLotService(database: Database) {
  async function detail(laboratory: LaboratoryScope, lotId: string, clientId: string | null): Promise<LotDetail> {
    const [row] = await readLots(laboratory, { lotId, clientId });
    const lot = found(row, 'lot');
    return { ...lot, apertures: await readApertures(laboratory, { lotId }) };
  }

  return {
    list: (actor: Actor): Promise<Lot[]> =>
      readLots(scoped(database, actor.laboratoryId), { clientId: ownClient(actor) }),

    get: (actor: Actor, lotId: string): Promise<LotDetail> =>
      detail(scoped(database, actor.laboratoryId), lotId, ownClient(actor)),

    add: (actor: Actor, body: LotBody): Promise<LotDetail> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) =>
          detail(laboratory, await addLot(laboratory, body), null),
        ),
      ),

    change: (actor: Actor, lotId: string, body: LotBody): Promise<LotDetail> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          await changeLot(laboratory, lotId, body);
          return detail(laboratory, lotId, null);
        }),
      ),

    /** Adds apertures, all or none; every serial number that is there twice is named. */
    addApertures: (actor: Actor, lotId: string, apertures: ApertureBody[]): Promise<LotDetail> =>
      inLaboratory(database, actor.laboratoryId, async (laboratory) => {
        if (!(await lockLot(laboratory, lotId))) throw notFound('lot');
        refuseRepeats(apertures, await serialsOfLot(laboratory, lotId));
        await addApertures(laboratory, lotId, apertures);
        return detail(laboratory, lotId, null);
      }),
  };
}

function refuseRepeats(apertures: ApertureBody[], there: Set<string>): void {
  const seen = new Set(there);
  const fields: Record<string, string> = {};
  for (const [index, { serial }] of apertures.entries()) {
    if (seen.has(serial)) {
      const where = there.has(serial) ? 'in the lot already' : 'in this list twice';
      fields[`apertures.${index}.serial`] = `${serial} is ${where}. Serial numbers are unique within a lot.`;
    }
    seen.add(serial);
  }
  const repeated = Object.keys(fields).length;
  if (repeated > 0) {
    const detail = `Nothing was added: ${repeated === 1 ? 'one serial number is' : `${repeated} serial numbers are`} not new.`;
    throw new ProblemError('conflict', detail, { fields });
  }
}
