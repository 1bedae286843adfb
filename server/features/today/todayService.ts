import type { Aperture, Lot } from '../../../shared/contracts/lots';
import type { Today } from '../../../shared/contracts/today';
import type { Database } from '../../database/Database';
import { scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { readApertures } from '../apertures/apertureReadModel';
import { readLots } from '../lots/lotReadModel';
import { ownClient } from '../lots/ownClient';
import { presentLotTo } from '../lots/presentLotTo';
import { readMeasurements } from '../measurements/readMeasurements';
import { readWorkCounts } from './todayReadModel';

const WEEK_MS = 7 * 86_400_000;
/** Most entries of each list. */
const MOST = 10;

export interface TodayDependencies {
  database: Database;
  now: () => Date;
}

export type TodayService = ReturnType<typeof createTodayService>;

/** What waits for the person who asks. People of a client see how far their own lots have come, and no results. */
export function createTodayService({ database, now }: TodayDependencies) {
  return {
    async get(actor: Actor): Promise<Today> {
      const laboratory = scoped(database, actor.laboratoryId);
      const lots = await readLots(laboratory, { clientId: ownClient(actor), unfinished: true });
      const shown = lots.slice(0, MOST).map((lot) => presentLotTo(actor.role, lot));
      if (actor.role === 'client') {
        return { next: null, running: 0, refusals: [], recent: [], lots: shown, week: { measured: 0, refused: 0 } };
      }
      const counts = await readWorkCounts(laboratory, new Date(now().getTime() - WEEK_MS));
      const newest = { newestOnly: true, limit: MOST };
      return {
        next: await nextAperture(laboratory, lots),
        running: counts.running,
        refusals: await readMeasurements(laboratory, { ...newest, states: ['refused', 'failed'] }),
        recent: await readMeasurements(laboratory, { ...newest, states: ['measured'] }),
        lots: shown,
        week: { measured: counts.measured, refused: counts.refused },
      };
    },
  };
}

/** The first aperture without any run, in the lot that is due first. */
async function nextAperture(laboratory: LaboratoryScope, lots: Lot[]): Promise<Today['next']> {
  for (const { id: lotId } of lots) {
    const apertures: Aperture[] = await readApertures(laboratory, { lotId });
    const next = apertures.find((aperture) => aperture.newest === null);
    if (next !== undefined) {
      const { id: apertureId, serial, nominalSizeUm, toleranceUm, lotNumber } = next;
      return { apertureId, serial, nominalSizeUm, toleranceUm, lotId, lotNumber };
    }
  }
  return null;
}
