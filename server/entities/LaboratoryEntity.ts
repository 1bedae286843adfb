import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A tenant: nothing crosses between two laboratories. */
@Entity('laboratory')
export class LaboratoryEntity {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) name: string;
  @Column({ type: 'timestamptz', default: () => 'now()' }) createdAt: Date;
}
