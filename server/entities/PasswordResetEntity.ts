import { Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm';
import { UserEntity } from './UserEntity';

/** A mailed permission to set a new password, for one use; only the hash of its token is kept. */
@Entity('password_reset')
@Unique('uq_password_reset_token_hash', ['tokenHash'])
@Index('ix_password_reset_user', ['userId'])
@ForeignKey(() => UserEntity, ['userId'], ['id'])
export class PasswordResetEntity {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid' }) userId: string;
  @Column({ type: 'text' }) tokenHash: string;
  @Column({ type: 'timestamptz' }) expiresAt: Date;
  @Column({ type: 'timestamptz', nullable: true }) usedAt: Date | null;
  @Column({ type: 'timestamptz', default: () => 'now()' }) createdAt: Date;
}
