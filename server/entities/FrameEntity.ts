import { Check, Column, Entity, Index, Unique } from 'typeorm';
import { frameStates } from '../../shared/contracts/captures';
import { oneOf } from './columns';
import { LaboratoryRow } from './LaboratoryRow';

/** storing: chunks are still arriving; such a row is shown to nobody. */
export const storedFrameStates = ['storing', ...frameStates] as const;
export type StoredFrameState = (typeof storedFrameStates)[number];

/** One exposure, kept byte for byte; the same bytes once per laboratory. The bytes are in frame_chunk. */
@Entity('frame')
@Unique('uq_frame_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_frame_sha256', ['laboratoryId', 'sha256'])
@Check('ck_frame_sha256', "sha256 ~ '^[0-9a-f]{64}$'")
@Check('ck_frame_stored', "state = 'storing' or (sha256 is not null and byte_size > 0 and chunk_count > 0)")
@Check('ck_frame_state', oneOf('state', storedFrameStates))
@Check('ck_frame_problem', "(state = 'unusable') = (problem is not null)")
@Check('ck_frame_sizes', 'byte_size >= 0 and chunk_count >= 0 and width_px > 0 and height_px > 0 and bit_depth > 0')
@Check(
  'ck_frame_ready',
  "state <> 'ready' or (format is not null and width_px is not null and height_px is not null and bit_depth is not null)",
)
@Check('ck_frame_attempts', 'attempts >= 0')
@Check('ck_frame_lease', '(lease_owner is null) = (lease_until is null)')
@Index('ix_frame_stored', ['leaseUntil'], { where: "state = 'stored'" })
export class FrameEntity extends LaboratoryRow {
  /** Null only while the chunks arrive; afterwards it never changes. */
  @Column({ type: 'text', nullable: true }) sha256: string | null;
  @Column({ type: 'integer', default: 0 }) byteSize: number;
  @Column({ type: 'integer', default: 0 }) chunkCount: number;
  @Column({ type: 'text', default: 'storing' }) state: StoredFrameState;
  @Column({ type: 'text', nullable: true }) problem: string | null;
  @Column({ type: 'text', nullable: true }) format: string | null;
  @Column({ type: 'integer', nullable: true }) widthPx: number | null;
  @Column({ type: 'integer', nullable: true }) heightPx: number | null;
  @Column({ type: 'integer', nullable: true }) bitDepth: number | null;
  @Column({ type: 'double precision', nullable: true }) exposureMs: number | null;
  @Column({ type: 'double precision', nullable: true }) blackCount: number | null;
  @Column({ type: 'double precision', nullable: true }) whiteCount: number | null;
  /** 99.99th percentile above black. */
  @Column({ type: 'double precision', nullable: true }) peakCounts: number | null;
  /** Peak as part of the range from black to white, 0 to 1. */
  @Column({ type: 'double precision', nullable: true }) peakFraction: number | null;
  /** Part of the pixels at or above white, 0 to 1. */
  @Column({ type: 'double precision', nullable: true }) clippedFraction: number | null;
  @Column({ type: 'double precision', nullable: true }) noiseCounts: number | null;
  /** How often a worker has taken the inspection up. */
  @Column({ type: 'integer', default: 0 }) attempts: number;
  @Column({ type: 'timestamptz', nullable: true }) leaseUntil: Date | null;
  @Column({ type: 'text', nullable: true }) leaseOwner: string | null;
}
