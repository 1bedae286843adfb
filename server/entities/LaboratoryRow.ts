import { Column, ForeignKey, PrimaryColumn } from 'typeorm';
import { LaboratoryEntity } from './LaboratoryEntity';

/** What every row of a laboratory has. Keys are made by the application. */
@ForeignKey(() => LaboratoryEntity, ['laboratoryId'], ['id'])
export abstract class LaboratoryRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid' }) laboratoryId: string;
  @Column({ type: 'timestamptz', default: () => 'now()' }) createdAt: Date;
}
