import { Column, Entity, Unique } from 'typeorm';
import { LaboratoryRow } from './LaboratoryRow';

/** A laser and a camera together; what they are and how far apart, each revision says. */
@Entity('bench')
@Unique('uq_bench_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_bench_name', ['laboratoryId', 'name'])
export class BenchEntity extends LaboratoryRow {
  @Column({ type: 'text' }) name: string;
}
