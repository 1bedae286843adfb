import { Column, Entity, Unique } from 'typeorm';
import { LaboratoryRow } from './LaboratoryRow';

/** Who ordered. */
@Entity('client')
@Unique('uq_client_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_client_name', ['laboratoryId', 'name'])
export class ClientEntity extends LaboratoryRow {
  @Column({ type: 'text' }) name: string;
  @Column({ type: 'text', default: '' }) address: string;
}
