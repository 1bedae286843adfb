import { Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm';
import { MembershipEntity } from './MembershipEntity';
import { UserEntity } from './UserEntity';

/** One refresh token of a family: every use spends it and adds the next one; only its hash is kept. */
@Entity('refresh_session')
@Unique('uq_refresh_session_token_hash', ['tokenHash'])
@Index('ix_refresh_session_family', ['familyId'])
@Index('ix_refresh_session_user', ['userId'])
@Index('ix_refresh_session_membership', ['membershipId'])
@ForeignKey(() => UserEntity, ['userId'], ['id'])
@ForeignKey(() => MembershipEntity, ['userId', 'membershipId'], ['userId', 'id'])
export class RefreshSessionEntity {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid' }) familyId: string;
  @Column({ type: 'uuid' }) userId: string;
  @Column({ type: 'uuid' }) membershipId: string;
  @Column({ type: 'text' }) tokenHash: string;
  @Column({ type: 'timestamptz', nullable: true }) spentAt: Date | null;
  @Column({ type: 'timestamptz', nullable: true }) revokedAt: Date | null;
  @Column({ type: 'timestamptz' }) expiresAt: Date;
  @Column({ type: 'timestamptz', default: () => 'now()' }) createdAt: Date;
}
