import { Check, Column, Entity, ForeignKey, Index, Unique } from 'typeorm';
import { roles, type Role } from '../../shared/contracts/roles';
import { ClientEntity } from './ClientEntity';
import { oneOf, Within } from './columns';
import { LaboratoryRow } from './LaboratoryRow';
import { UserEntity } from './UserEntity';

/** What a person may do in one laboratory. Ended access stays as a row, because old work names its people. */
@Entity('membership')
@Unique('uq_membership_laboratory_user', ['laboratoryId', 'userId'])
@Unique('uq_membership_laboratory_id', ['laboratoryId', 'id'])
@Unique('uq_membership_user_id', ['userId', 'id'])
@Check('ck_membership_role', oneOf('role', roles))
@Check('ck_membership_client', "(role = 'client') = (client_id is not null)")
@Index('ix_membership_client', ['clientId'])
@ForeignKey(() => UserEntity, ['userId'], ['id'])
@Within(() => ClientEntity, 'clientId')
export class MembershipEntity extends LaboratoryRow {
  @Column({ type: 'uuid' }) userId: string;
  @Column({ type: 'text' }) role: Role;
  @Column({ type: 'uuid', nullable: true }) clientId: string | null;
  @Column({ type: 'boolean', default: true }) active: boolean;
}
