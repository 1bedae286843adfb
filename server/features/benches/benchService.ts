import type { BenchBody, RevisionBody } from '../../../shared/contracts/benches';
import { withConstraintProblems, type ConstraintProblem } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { found } from '../../http/ProblemError';
import {
  addBench,
  addRevision,
  newestRevisionNumber,
  readBench,
  readBenches,
  readRevisions,
  type BenchWithRevisions,
} from './benchRepository';

/** Problems of a revision; `within` is where it stands in the body. */
const revisionProblems = (within: string): Record<string, ConstraintProblem> => ({
  fk_bench_revision_laser_id: {
    type: 'invalid',
    field: `${within}laserId`,
    message: 'Choose a laser of the laboratory.',
  },
  fk_bench_revision_camera_id: {
    type: 'invalid',
    field: `${within}cameraId`,
    message: 'Choose a camera of the laboratory.',
  },
});
const nameTaken: ConstraintProblem = {
  type: 'conflict',
  field: 'name',
  message: 'Another bench of the laboratory has this name. Choose another, or revise that bench.',
};

export type BenchService = ReturnType<typeof createBenchService>;

/** Benches. They are revised, never edited: captures and measurements keep the revision that they used. */
export function createBenchService(database: Database) {
  async function detail(laboratory: LaboratoryScope, benchId: string): Promise<BenchWithRevisions> {
    const bench = found(await readBench(laboratory, benchId), 'bench');
    return { bench, revisions: await readRevisions(laboratory, [benchId]) };
  }

  return {
    async list(actor: Actor): Promise<BenchWithRevisions[]> {
      const laboratory = scoped(database, actor.laboratoryId);
      const benches = await readBenches(laboratory);
      const revisions = await readRevisions(
        laboratory,
        benches.map(({ id }) => id),
      );
      return benches.map((bench) => ({ bench, revisions: revisions.filter(({ benchId }) => benchId === bench.id) }));
    },

    get: (actor: Actor, benchId: string): Promise<BenchWithRevisions> =>
      detail(scoped(database, actor.laboratoryId), benchId),

    add: (actor: Actor, { name, revision }: BenchBody): Promise<BenchWithRevisions> =>
      withConstraintProblems({ uq_bench_name: nameTaken, ...revisionProblems('revision.') }, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          const benchId = await addBench(laboratory, name);
          await addRevision(laboratory, benchId, 1, actor.userId, revision);
          return detail(laboratory, benchId);
        }),
      ),

    revise: (actor: Actor, benchId: string, revision: RevisionBody): Promise<BenchWithRevisions> =>
      withConstraintProblems(revisionProblems(''), () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          found(await readBench(laboratory, benchId, 'update'), 'bench');
          const number = (await newestRevisionNumber(laboratory, benchId)) + 1;
          await addRevision(laboratory, benchId, number, actor.userId, revision);
          return detail(laboratory, benchId);
        }),
      ),
  };
}
