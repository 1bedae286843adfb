import { Check, Column, Entity, Index, Unique } from 'typeorm';
import { BenchEntity } from './BenchEntity';
import { CameraEntity } from './CameraEntity';
import { ByMember, finiteNotNegative, finitePositive, oneOf, Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { LaserEntity } from './LaserEntity';
import { MembershipEntity } from './MembershipEntity';

export const illuminationKinds = ['plane', 'diverging', 'gaussian'] as const;

/** A bench as it stood from one day on. Never changed: a trigger refuses it. */
@Entity('bench_revision')
@Unique('uq_bench_revision_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_bench_revision_revision', ['benchId', 'revision'])
@Check('ck_bench_revision_revision', 'revision >= 1')
@Check('ck_bench_revision_distance', finitePositive('distance_mm'))
@Check('ck_bench_revision_distance_uncertainty', finiteNotNegative('distance_uncertainty_mm'))
@Check('ck_bench_revision_illumination_kind', oneOf('illumination_kind', illuminationKinds))
@Check('ck_bench_revision_source', "(illumination_kind = 'diverging') = (source_distance_mm is not null)")
@Check('ck_bench_revision_beam', "(illumination_kind = 'gaussian') = (beam_radius_um is not null)")
@Check('ck_bench_revision_source_distance', finitePositive('source_distance_mm'))
@Check('ck_bench_revision_beam_radius', finitePositive('beam_radius_um'))
@Index('ix_bench_revision_laser', ['laserId'])
@Index('ix_bench_revision_camera', ['cameraId'])
@Within(() => BenchEntity, 'benchId')
@Within(() => LaserEntity, 'laserId')
@Within(() => CameraEntity, 'cameraId')
@ByMember(() => MembershipEntity, 'createdBy')
export class BenchRevisionEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) benchId: string;
  /** 1, 2, 3 … within the bench. */
  @Column({ type: 'integer' }) revision: number;
  @Column({ type: 'uuid' }) laserId: string;
  @Column({ type: 'uuid' }) cameraId: string;
  /** Aperture to sensitive plane. */
  @Column({ type: 'double precision' }) distanceMm: number;
  /** Standard uncertainty (k = 1). */
  @Column({ type: 'double precision' }) distanceUncertaintyMm: number;
  @Column({ type: 'text' }) illuminationKind: (typeof illuminationKinds)[number];
  @Column({ type: 'double precision', nullable: true }) sourceDistanceMm: number | null;
  @Column({ type: 'double precision', nullable: true }) beamRadiusUm: number | null;
  @Column({ type: 'text', default: '' }) note: string;
  @Column({ type: 'uuid' }) createdBy: string;
}
