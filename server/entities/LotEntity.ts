import { Column, Entity, Index, Unique } from 'typeorm';
import { ClientEntity } from './ClientEntity';
import { Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';

/** Apertures that arrived together, for one client. */
@Entity('lot')
@Unique('uq_lot_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_lot_number', ['laboratoryId', 'number'])
@Index('ix_lot_client', ['clientId'])
@Within(() => ClientEntity, 'clientId')
export class LotEntity extends LaboratoryRow {
  @Column({ type: 'text' }) number: string;
  @Column({ type: 'uuid' }) clientId: string;
  @Column({ type: 'text', default: '' }) orderReference: string;
  /** Calendar day, `2026-03-04`. */
  @Column({ type: 'date', nullable: true }) dueOn: string | null;
  @Column({ type: 'text', default: '' }) note: string;
}
