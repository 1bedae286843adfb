import type { RadialProfile } from '../../../shared/contracts/measureResult';
import type {
  Compared,
  Measurement,
  MeasurementDetail,
  MeasurementSettings,
} from '../../../shared/contracts/measurements';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { notFound, ProblemError } from '../../http/ProblemError';
import type { Queue } from '../../worker/queue/createQueue';
import { addRun } from './addRun';
import { readExtra, readHistory, readMisfit, readProfile, type StoredMisfit } from './measurementRepository';
import { presentCompared } from './presentCompared';
import { readMeasurements, type MeasurementFilter } from './readMeasurements';
import { readRunInputs } from './readRunInputs';

export interface MeasurementDependencies {
  database: Database;
  queue: Queue;
}

export type MeasurementService = ReturnType<typeof createMeasurementService>;

/** Runs of the engine: what they gave, and asking for new ones. A run that has ended never changes. */
export function createMeasurementService({ database, queue }: MeasurementDependencies) {
  async function one(laboratory: LaboratoryScope, id: string): Promise<Measurement> {
    const [measurement] = await readMeasurements(laboratory, { ids: [id] });
    if (!measurement) throw notFound('measurement');
    return measurement;
  }

  async function detail(laboratory: LaboratoryScope, id: string): Promise<MeasurementDetail> {
    const measurement = await one(laboratory, id);
    const extra = await readExtra(laboratory, id);
    // A run that still waits shows what it would be given now.
    const inputs = extra?.inputs ?? (await readRunInputs(laboratory, id))?.measureCase;
    if (!extra || !inputs) throw notFound('measurement');
    const history = await readHistory(laboratory, measurement.captureFrameId);
    return { ...measurement, ...extra, inputs, history };
  }

  async function profile(laboratory: LaboratoryScope, id: string): Promise<RadialProfile> {
    const found = await readProfile(laboratory, id);
    if (found) return found;
    await one(laboratory, id);
    throw new ProblemError('not-found', 'This measurement has no radial profile: it gave no size.');
  }

  return {
    list(actor: Actor, filter: MeasurementFilter): Promise<Measurement[]> {
      return readMeasurements(scoped(database, actor.laboratoryId), filter);
    },

    get(actor: Actor, id: string): Promise<MeasurementDetail> {
      return detail(scoped(database, actor.laboratoryId), id);
    },

    profile(actor: Actor, id: string): Promise<RadialProfile> {
      return profile(scoped(database, actor.laboratoryId), id);
    },

    async profileWithDetail(actor: Actor, id: string): Promise<[MeasurementDetail, RadialProfile]> {
      const laboratory = scoped(database, actor.laboratoryId);
      return [await detail(laboratory, id), await profile(laboratory, id)];
    },

    async misfit(actor: Actor, id: string): Promise<StoredMisfit> {
      const laboratory = scoped(database, actor.laboratoryId);
      const found = await readMisfit(laboratory, id);
      if (found) return found;
      await one(laboratory, id);
      throw new ProblemError('not-found', 'This measurement has no misfit: it gave no size.');
    },

    /** A new run of the same frame; settings that are not given stay as they were. */
    again(actor: Actor, id: string, change: Partial<MeasurementSettings>): Promise<Measurement> {
      return inLaboratory(database, actor.laboratoryId, async (laboratory, transaction) => {
        const { captureId, captureFrameId, frameId } = await one(laboratory, id);
        const extra = await readExtra(laboratory, id);
        if (!extra) throw notFound('measurement');
        const given = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
        const newId = await addRun(laboratory, transaction, queue, {
          captureId,
          captureFrameId,
          frameId,
          settings: { ...extra.settings, ...given },
          createdBy: actor.userId,
        });
        return one(laboratory, newId);
      });
    },

    /** The chosen measurements that gave a size, in the order they were asked for. */
    async compared(actor: Actor, ids: readonly string[]): Promise<Compared[]> {
      const laboratory = scoped(database, actor.laboratoryId);
      const found = new Map((await readMeasurements(laboratory, { ids })).map((m) => [m.id, m]));
      const compared: Compared[] = [];
      for (const id of ids) {
        const measurement = found.get(id);
        const extra = measurement && (await readExtra(laboratory, id));
        const entry = measurement && extra ? presentCompared(measurement, extra) : null;
        if (entry) compared.push(entry);
      }
      return compared;
    },
  };
}
