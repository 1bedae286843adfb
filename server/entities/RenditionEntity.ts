import { Check, Column, Entity, Unique } from 'typeorm';
import { oneOf, Within } from './columns';
import { FrameEntity } from './FrameEntity';
import { LaboratoryRow } from './LaboratoryRow';
import { MeasurementEntity } from './MeasurementEntity';

export const renditionKinds = ['thumbnail', 'plane', 'misfit'] as const;
export type RenditionKind = (typeof renditionKinds)[number];

/** A picture or plane made once from a frame or a measurement, so that no request decodes a file. */
@Entity('rendition')
@Unique('uq_rendition_frame_kind', ['frameId', 'kind'])
@Unique('uq_rendition_measurement_kind', ['measurementId', 'kind'])
@Check('ck_rendition_kind', oneOf('kind', renditionKinds))
@Check(
  'ck_rendition_owner',
  "(kind = 'misfit') = (measurement_id is not null) and num_nonnulls(frame_id, measurement_id) = 1",
)
@Check('ck_rendition_dimensions', 'width_px > 0 and height_px > 0')
@Within(() => FrameEntity, 'frameId')
@Within(() => MeasurementEntity, 'measurementId')
export class RenditionEntity extends LaboratoryRow {
  @Column({ type: 'uuid', nullable: true }) frameId: string | null;
  @Column({ type: 'uuid', nullable: true }) measurementId: string | null;
  @Column({ type: 'text' }) kind: RenditionKind;
  @Column({ type: 'integer' }) widthPx: number;
  @Column({ type: 'integer' }) heightPx: number;
  /** How the bytes are laid out, for example `uint16-le`, `tone8` or either with `+gzip`. */
  @Column({ type: 'text' }) encoding: string;
  @Column({ type: 'bytea', select: false }) bytes: Buffer;
}
