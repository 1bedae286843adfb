import { Check, Column, Entity, Unique } from 'typeorm';
import { Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { MeasurementEntity } from './MeasurementEntity';

/** Radial profile of a measurement: arrays of equal length, one entry a bin. Never changed: a trigger refuses it. */
@Entity('profile')
@Unique('uq_profile_measurement', ['measurementId'])
@Check(
  'ck_profile_lengths',
  'cardinality(mean_counts) = cardinality(radius_mm) and cardinality(standard_error_counts) = cardinality(radius_mm)' +
    ' and cardinality(pixel_count) = cardinality(radius_mm) and cardinality(model_counts) = cardinality(radius_mm)',
)
@Within(() => MeasurementEntity, 'measurementId')
export class ProfileEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) measurementId: string;
  @Column({ type: 'double precision', array: true }) radiusMm: number[];
  @Column({ type: 'double precision', array: true }) meanCounts: number[];
  @Column({ type: 'double precision', array: true }) standardErrorCounts: number[];
  @Column({ type: 'integer', array: true }) pixelCount: number[];
  @Column({ type: 'double precision', array: true }) modelCounts: number[];
}
