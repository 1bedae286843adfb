import { In } from 'typeorm';
import type { RevisionBody } from '../../../shared/contracts/benches';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { BenchEntity } from '../../entities/BenchEntity';
import { BenchRevisionEntity } from '../../entities/BenchRevisionEntity';
import { CameraEntity } from '../../entities/CameraEntity';
import { LaserEntity } from '../../entities/LaserEntity';

/** A revision with the laser and the camera it names, as they are now. */
export interface Revision extends BenchRevisionEntity {
  laser: LaserEntity;
  camera: CameraEntity;
  /** Name of the person. */
  createdByName: string;
}
export interface BenchWithRevisions {
  bench: BenchEntity;
  /** Newest first; never empty. */
  revisions: Revision[];
}

export const readBenches = (laboratory: LaboratoryScope): Promise<BenchEntity[]> =>
  laboratory.find(BenchEntity, { order: { name: 'ASC' } });

/** The bench; held, if wanted, so that two revisions cannot take the same number. */
export const readBench = (laboratory: LaboratoryScope, id: string, lock?: 'update'): Promise<BenchEntity | null> =>
  laboratory.findOne(BenchEntity, { where: { id }, lock });

/** Revisions of the given benches, newest first. */
export async function readRevisions(laboratory: LaboratoryScope, benchIds: string[]): Promise<Revision[]> {
  const revisions = await laboratory.find(BenchRevisionEntity, {
    where: { benchId: In(benchIds) },
    order: { revision: 'DESC' },
  });
  const lasers = await laboratory.find(LaserEntity, { where: { id: In(revisions.map((r) => r.laserId)) } });
  const cameras = await laboratory.find(CameraEntity, { where: { id: In(revisions.map((r) => r.cameraId)) } });
  const names = await laboratory.query<{ id: string; name: string }>(
    `select u.id, u.name from app_user u join membership m on m.user_id = u.id and m.laboratory_id = $1
      where u.id = any($2)`,
    [revisions.map((r) => r.createdBy)],
  );
  const laserOf = new Map(lasers.map((laser) => [laser.id, laser]));
  const cameraOf = new Map(cameras.map((camera) => [camera.id, camera]));
  const nameOf = new Map(names.map(({ id, name }) => [id, name]));
  // The foreign keys of a revision make sure that all three are there.
  return revisions.map((revision) => ({
    ...revision,
    laser: laserOf.get(revision.laserId) as LaserEntity,
    camera: cameraOf.get(revision.cameraId) as CameraEntity,
    createdByName: nameOf.get(revision.createdBy) as string,
  }));
}

export const addBench = (laboratory: LaboratoryScope, name: string): Promise<string> =>
  laboratory.insert(BenchEntity, { name });

export async function newestRevisionNumber(laboratory: LaboratoryScope, benchId: string): Promise<number> {
  const [row] = await laboratory.query<{ newest: number }>(
    'select coalesce(max(revision), 0) as newest from bench_revision where laboratory_id = $1 and bench_id = $2',
    [benchId],
  );
  return row?.newest ?? 0;
}

export async function addRevision(
  laboratory: LaboratoryScope,
  benchId: string,
  revision: number,
  createdBy: string,
  { illumination, ...body }: RevisionBody,
): Promise<void> {
  await laboratory.insert(BenchRevisionEntity, {
    ...body,
    benchId,
    revision,
    createdBy,
    illuminationKind: illumination.kind,
    sourceDistanceMm: illumination.kind === 'diverging' ? illumination.sourceDistanceMm : null,
    beamRadiusUm: illumination.kind === 'gaussian' ? illumination.beamRadiusUm : null,
  });
}
