import { Check, Column, Entity, Unique } from 'typeorm';
import { laserClasses } from '../../shared/contracts/benches';
import { finiteNotNegative, finitePositive, oneOf } from './columns';
import { LaboratoryRow } from './LaboratoryRow';

/** A light source. */
@Entity('laser')
@Unique('uq_laser_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_laser_name', ['laboratoryId', 'name'])
@Check('ck_laser_wavelength', finitePositive('wavelength_nm'))
@Check('ck_laser_wavelength_uncertainty', finiteNotNegative('wavelength_uncertainty_nm'))
@Check('ck_laser_class', oneOf('laser_class', laserClasses))
@Check('ck_laser_power', finitePositive('power_mw'))
export class LaserEntity extends LaboratoryRow {
  @Column({ type: 'text' }) name: string;
  @Column({ type: 'text', default: '' }) serial: string;
  /** In air. */
  @Column({ type: 'double precision' }) wavelengthNm: number;
  /** Standard uncertainty (k = 1). */
  @Column({ type: 'double precision' }) wavelengthUncertaintyNm: number;
  @Column({ type: 'text' }) laserClass: (typeof laserClasses)[number];
  @Column({ type: 'double precision', nullable: true }) powerMw: number | null;
  @Column({ type: 'text', default: '' }) note: string;
}
