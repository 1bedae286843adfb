import { Column, Entity, Index, Unique } from 'typeorm';
import { ApertureEntity } from './ApertureEntity';
import { BenchRevisionEntity } from './BenchRevisionEntity';
import { ByMember, Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { MembershipEntity } from './MembershipEntity';

/** The frames taken of one aperture on one bench revision in one go. */
@Entity('capture')
@Unique('uq_capture_laboratory_id', ['laboratoryId', 'id'])
@Index('ix_capture_aperture', ['apertureId'])
@Index('ix_capture_bench_revision', ['benchRevisionId'])
@Index('ix_capture_created_at', ['laboratoryId', 'createdAt'])
@Within(() => ApertureEntity, 'apertureId')
@Within(() => BenchRevisionEntity, 'benchRevisionId')
@ByMember(() => MembershipEntity, 'createdBy')
export class CaptureEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) apertureId: string;
  @Column({ type: 'uuid' }) benchRevisionId: string;
  @Column({ type: 'text', default: '' }) note: string;
  @Column({ type: 'uuid' }) createdBy: string;
}
