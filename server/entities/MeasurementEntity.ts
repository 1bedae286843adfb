import { Check, Column, Entity, ForeignKey, Index, Unique } from 'typeorm';
import type { MeasureCase } from '../../shared/contracts/measureCase';
import {
  failureReasons,
  refusalReasons,
  stages,
  type FailureReason,
  type Flag,
  type MeasureResult,
  type RefusalReason,
  type Stage,
} from '../../shared/contracts/measureResult';
import {
  measurementStates,
  type MeasurementSettings,
  type MeasurementState,
} from '../../shared/contracts/measurements';
import { CaptureFrameEntity } from './CaptureFrameEntity';
import { ByMember, finiteNotNegative, finitePositive, oneOf } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { MembershipEntity } from './MembershipEntity';

/**
 * One run of the engine over a frame of a capture. Once measured, refused or failed it never changes: a trigger refuses
 * it. The lease (`lease_owner`, `lease_until`) says which worker has the run in hand.
 */
@Entity('measurement')
@Unique('uq_measurement_laboratory_id', ['laboratoryId', 'id'])
@Check('ck_measurement_state', oneOf('state', measurementStates))
@Check('ck_measurement_stage', oneOf('stage', stages))
@Check('ck_measurement_reason_word', oneOf('reason', [...refusalReasons, ...failureReasons]))
@Check('ck_measurement_finished', "(state in ('measured', 'refused', 'failed')) = (finished_at is not null)")
@Check('ck_measurement_reason', "(state in ('refused', 'failed')) = (reason is not null)")
@Check('ck_measurement_result', "(state in ('measured', 'refused', 'failed')) = (result is not null)")
@Check('ck_measurement_size_state', "size_um is null or state = 'measured'")
@Check('ck_measurement_size', finitePositive('size_um'))
@Check('ck_measurement_standard_uncertainty', finiteNotNegative('standard_uncertainty_um'))
@Check('ck_measurement_fit_uncertainty', finiteNotNegative('fit_uncertainty_um'))
@Check('ck_measurement_expanded_uncertainty', finiteNotNegative('expanded_uncertainty_um'))
@Check('ck_measurement_coverage_factor', finitePositive('coverage_factor'))
@Check('ck_measurement_counts', 'dark_count >= 0 and attempts >= 0')
@Check('ck_measurement_lease', '(lease_owner is null) = (lease_until is null)')
@Index('ix_measurement_capture_frame', ['captureFrameId', 'createdAt'])
@Index('ix_measurement_capture', ['captureId'])
@Index('ix_measurement_created_at', ['laboratoryId', 'createdAt'])
@Index('ix_measurement_unfinished', ['leaseUntil'], { where: "state in ('waiting', 'measuring')" })
@ForeignKey(
  () => CaptureFrameEntity,
  ['laboratoryId', 'captureId', 'captureFrameId'],
  ['laboratoryId', 'captureId', 'id'],
)
@ByMember(() => MembershipEntity, 'createdBy')
export class MeasurementEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) captureId: string;
  @Column({ type: 'uuid' }) captureFrameId: string;
  @Column({ type: 'text', default: 'waiting' }) state: MeasurementState;
  @Column({ type: 'text', nullable: true }) stage: Stage | null;
  @Column({ type: 'jsonb' }) settings: MeasurementSettings;
  /** What the engine was given; null until the run is taken up. */
  @Column({ type: 'jsonb', nullable: true }) inputs: MeasureCase | null;
  @Column({ type: 'jsonb', nullable: true }) result: MeasureResult | null;
  @Column({ type: 'double precision', nullable: true }) sizeUm: number | null;
  @Column({ type: 'double precision', nullable: true }) standardUncertaintyUm: number | null;
  @Column({ type: 'double precision', nullable: true }) fitUncertaintyUm: number | null;
  @Column({ type: 'double precision', nullable: true }) expandedUncertaintyUm: number | null;
  @Column({ type: 'double precision', nullable: true }) coverageFactor: number | null;
  @Column({ type: 'text', nullable: true }) reason: RefusalReason | FailureReason | null;
  @Column({ type: 'text', nullable: true }) message: string | null;
  @Column({ type: 'text', array: true, default: () => "'{}'" }) flags: Flag[];
  @Column({ type: 'integer', default: 0 }) darkCount: number;
  @Column({ type: 'integer', default: 0 }) attempts: number;
  @Column({ type: 'timestamptz', nullable: true }) leaseUntil: Date | null;
  @Column({ type: 'text', nullable: true }) leaseOwner: string | null;
  @Column({ type: 'uuid' }) createdBy: string;
  @Column({ type: 'timestamptz', nullable: true }) startedAt: Date | null;
  @Column({ type: 'timestamptz', nullable: true }) finishedAt: Date | null;
}
