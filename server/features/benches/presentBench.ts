import type { Bench, BenchDetail, BenchRevision, Illumination } from '../../../shared/contracts/benches';
import type { BenchRevisionEntity } from '../../entities/BenchRevisionEntity';
import { presentCamera } from '../cameras/presentCamera';
import { presentLaser } from '../lasers/presentLaser';
import type { BenchWithRevisions, Revision } from './benchRepository';

export function presentIllumination(revision: BenchRevisionEntity): Illumination {
  const { illuminationKind: kind, sourceDistanceMm, beamRadiusUm } = revision;
  // The table's checks tie each quantity to its kind.
  if (kind === 'diverging') return { kind, sourceDistanceMm: sourceDistanceMm as number };
  if (kind === 'gaussian') return { kind, beamRadiusUm: beamRadiusUm as number };
  return { kind };
}

export function presentRevision(revision: Revision): BenchRevision {
  return {
    id: revision.id,
    revision: revision.revision,
    laserId: revision.laserId,
    cameraId: revision.cameraId,
    distanceMm: revision.distanceMm,
    distanceUncertaintyMm: revision.distanceUncertaintyMm,
    illumination: presentIllumination(revision),
    note: revision.note,
    createdAt: revision.createdAt.toISOString(),
    createdBy: revision.createdByName,
    laser: presentLaser(revision.laser),
    camera: presentCamera(revision.camera),
  };
}

export function presentBench({ bench, revisions }: BenchWithRevisions): Bench {
  const [current] = revisions;
  if (current === undefined) throw new Error(`bench ${bench.id} has no revision`);
  return {
    id: bench.id,
    name: bench.name,
    createdAt: bench.createdAt.toISOString(),
    current: presentRevision(current),
  };
}

export function presentBenchDetail(bench: BenchWithRevisions): BenchDetail {
  return { ...presentBench(bench), revisions: bench.revisions.map(presentRevision) };
}
