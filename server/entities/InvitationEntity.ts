import { Check, Column, Entity, Index, Unique } from 'typeorm';
import { roles, type Role } from '../../shared/contracts/roles';
import { ClientEntity } from './ClientEntity';
import { ByMember, oneOf, Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { MembershipEntity } from './MembershipEntity';

/** A place offered to a mail address; only the hash of its token is kept. */
@Entity('invitation')
@Unique('uq_invitation_token_hash', ['tokenHash'])
@Check('ck_invitation_role', oneOf('role', roles))
@Check('ck_invitation_client', "(role = 'client') = (client_id is not null)")
@Check('ck_invitation_email', 'email = lower(email)')
@Check('ck_invitation_end', 'accepted_at is null or withdrawn_at is null')
@Index('ix_invitation_laboratory', ['laboratoryId', 'email'])
@Index('ix_invitation_client', ['clientId'])
@Within(() => ClientEntity, 'clientId')
@ByMember(() => MembershipEntity, 'invitedBy')
export class InvitationEntity extends LaboratoryRow {
  @Column({ type: 'text' }) email: string;
  @Column({ type: 'text' }) role: Role;
  @Column({ type: 'uuid', nullable: true }) clientId: string | null;
  @Column({ type: 'text' }) tokenHash: string;
  @Column({ type: 'uuid' }) invitedBy: string;
  @Column({ type: 'timestamptz' }) expiresAt: Date;
  @Column({ type: 'timestamptz', nullable: true }) acceptedAt: Date | null;
  @Column({ type: 'timestamptz', nullable: true }) withdrawnAt: Date | null;
}
