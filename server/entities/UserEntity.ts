import { Check, Column, Entity, PrimaryColumn, Unique } from 'typeorm';

/** A person, once for the whole service; memberships tie the person to laboratories. */
@Entity('app_user')
@Unique('uq_app_user_email', ['email'])
@Check('ck_app_user_email', 'email = lower(email)')
export class UserEntity {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) name: string;
  @Column({ type: 'text' }) email: string;
  @Column({ type: 'text', select: false }) passwordHash: string;
  @Column({ type: 'timestamptz', default: () => 'now()' }) createdAt: Date;
}
