import { Check, Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm';
import { FrameEntity } from './FrameEntity';

/** Largest chunk, bytes. */
export const CHUNK_BYTES = 1024 * 1024;

/** A slice of a frame's file; position 0 is its beginning. Stored uncompressed, so that slices can be read. */
@Entity('frame_chunk')
@Check('ck_frame_chunk_position', 'position >= 0')
@Check('ck_frame_chunk_bytes', `octet_length(bytes) >= 1 and octet_length(bytes) <= ${CHUNK_BYTES}`)
@ForeignKey(() => FrameEntity, ['frameId'], ['id'], { onDelete: 'CASCADE' })
export class FrameChunkEntity {
  @PrimaryColumn({ type: 'uuid' }) frameId: string;
  @PrimaryColumn({ type: 'integer' }) position: number;
  @Column({ type: 'bytea', select: false }) bytes: Buffer;
}
