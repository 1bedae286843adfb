import { Check, Column, Entity, Unique } from 'typeorm';
import { finiteNotNegative, finitePositive } from './columns';
import { LaboratoryRow } from './LaboratoryRow';

/** A sensor. What is null is found from the file or the frame. */
@Entity('camera')
@Unique('uq_camera_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_camera_name', ['laboratoryId', 'name'])
@Check('ck_camera_pixel_pitch', finitePositive('pixel_pitch_um'))
@Check('ck_camera_pixel_pitch_uncertainty', finiteNotNegative('pixel_pitch_uncertainty_um'))
@Check('ck_camera_dimensions', 'width_px > 0 and height_px > 0 and bit_depth >= 1 and bit_depth <= 16')
@Check('ck_camera_gain', finitePositive('electrons_per_count'))
@Check('ck_camera_read_noise', finiteNotNegative('read_noise_electrons'))
@Check('ck_camera_levels', 'black_count >= 0 and white_count > 0 and white_count > black_count')
@Check('ck_camera_cover_glass', 'cover_glass_mm >= 0 and (cover_glass_mm = 0 or cover_glass_index is not null)')
@Check('ck_camera_cover_glass_index', 'cover_glass_index >= 1 and cover_glass_index <= 3')
export class CameraEntity extends LaboratoryRow {
  @Column({ type: 'text' }) name: string;
  @Column({ type: 'text', default: '' }) serial: string;
  @Column({ type: 'double precision' }) pixelPitchUm: number;
  /** Standard uncertainty (k = 1). */
  @Column({ type: 'double precision' }) pixelPitchUncertaintyUm: number;
  @Column({ type: 'integer' }) widthPx: number;
  @Column({ type: 'integer' }) heightPx: number;
  @Column({ type: 'integer' }) bitDepth: number;
  @Column({ type: 'double precision', nullable: true }) electronsPerCount: number | null;
  @Column({ type: 'double precision', nullable: true }) readNoiseElectrons: number | null;
  @Column({ type: 'double precision', nullable: true }) blackCount: number | null;
  @Column({ type: 'double precision', nullable: true }) whiteCount: number | null;
  @Column({ type: 'double precision', nullable: true }) coverGlassMm: number | null;
  @Column({ type: 'double precision', nullable: true }) coverGlassIndex: number | null;
  @Column({ type: 'text', default: '' }) note: string;
}
