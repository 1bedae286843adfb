import { Check, Column, Entity, Index, Unique } from 'typeorm';
import { frameKinds, type FrameKind } from '../../shared/contracts/captures';
import { CaptureEntity } from './CaptureEntity';
import { ByMember, oneOf, Within } from './columns';
import { FrameEntity } from './FrameEntity';
import { LaboratoryRow } from './LaboratoryRow';
import { MembershipEntity } from './MembershipEntity';

/** A frame's place in a capture. */
@Entity('capture_frame')
@Unique('uq_capture_frame_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_capture_frame_capture_id', ['laboratoryId', 'captureId', 'id'])
@Unique('uq_capture_frame_frame', ['captureId', 'frameId'])
@Check('ck_capture_frame_kind', oneOf('kind', frameKinds))
@Index('ix_capture_frame_frame', ['frameId'])
@Within(() => CaptureEntity, 'captureId')
@Within(() => FrameEntity, 'frameId')
@ByMember(() => MembershipEntity, 'createdBy')
export class CaptureFrameEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) captureId: string;
  @Column({ type: 'uuid' }) frameId: string;
  @Column({ type: 'text' }) kind: FrameKind;
  /** The file's name as it came. */
  @Column({ type: 'text' }) name: string;
  @Column({ type: 'boolean', default: false }) leftOut: boolean;
  @Column({ type: 'uuid' }) createdBy: string;
}
