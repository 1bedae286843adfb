import { Check, Column, Entity, Unique } from 'typeorm';
import { apertureKinds, type ApertureKind } from '../../shared/contracts/lots';
import { finiteNotNegative, finitePositive, oneOf, Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { LotEntity } from './LotEntity';

/** The piece under test. */
@Entity('aperture')
@Unique('uq_aperture_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_aperture_serial', ['lotId', 'serial'])
@Check('ck_aperture_kind', oneOf('kind', apertureKinds))
@Check('ck_aperture_nominal_size', finitePositive('nominal_size_um'))
@Check('ck_aperture_tolerance', finiteNotNegative('tolerance_um'))
@Within(() => LotEntity, 'lotId')
export class ApertureEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) lotId: string;
  @Column({ type: 'text' }) serial: string;
  @Column({ type: 'text' }) kind: ApertureKind;
  @Column({ type: 'double precision' }) nominalSizeUm: number;
  /** Permitted deviation either way. */
  @Column({ type: 'double precision', nullable: true }) toleranceUm: number | null;
  @Column({ type: 'text', default: '' }) note: string;
}
