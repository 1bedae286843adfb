import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { oneOf } from './columns';
import { LaboratoryEntity } from './LaboratoryEntity';

export const mailKinds = ['invitation', 'password-reset', 'password-changed'] as const;
export type MailKind = (typeof mailKinds)[number];
export const mailStates = ['waiting', 'sent', 'failed'] as const;
export type MailState = (typeof mailStates)[number];

/** Outbox: a mail is written in the transaction of what caused it and sent afterwards. */
@Entity('mail_message')
@Check('ck_mail_message_kind', oneOf('kind', mailKinds))
@Check('ck_mail_message_state', oneOf('state', mailStates))
@Check('ck_mail_message_sent', "(state = 'sent') = (sent_at is not null)")
@Index('ix_mail_message_waiting', ['nextAttemptAt'], { where: "state = 'waiting'" })
@Index('ix_mail_message_laboratory', ['laboratoryId'])
@ForeignKey(() => LaboratoryEntity, ['laboratoryId'], ['id'])
export class MailMessageEntity {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid', nullable: true }) laboratoryId: string | null;
  @Column({ type: 'text' }) toAddress: string;
  @Column({ type: 'text' }) subject: string;
  @Column({ type: 'text' }) bodyText: string;
  @Column({ type: 'text' }) kind: MailKind;
  @Column({ type: 'text', default: 'waiting' }) state: MailState;
  @Column({ type: 'integer', default: 0 }) attempts: number;
  @Column({ type: 'timestamptz', default: () => 'now()' }) nextAttemptAt: Date;
  @Column({ type: 'text', nullable: true }) lastError: string | null;
  @Column({ type: 'timestamptz', nullable: true }) sentAt: Date | null;
  @Column({ type: 'timestamptz', default: () => 'now()' }) createdAt: Date;
}
