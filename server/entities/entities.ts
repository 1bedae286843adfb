import { ApertureEntity } from './ApertureEntity';
import { BenchEntity } from './BenchEntity';
import { BenchRevisionEntity } from './BenchRevisionEntity';
import { CameraEntity } from './CameraEntity';
import { CaptureEntity } from './CaptureEntity';
import { CaptureFrameEntity } from './CaptureFrameEntity';
import { ClientEntity } from './ClientEntity';
import { FrameChunkEntity } from './FrameChunkEntity';
import { FrameEntity } from './FrameEntity';
import { InvitationEntity } from './InvitationEntity';
import { LaboratoryEntity } from './LaboratoryEntity';
import { LaserEntity } from './LaserEntity';
import { LotEntity } from './LotEntity';
import { MailMessageEntity } from './MailMessageEntity';
import { MeasurementEntity } from './MeasurementEntity';
import { MembershipEntity } from './MembershipEntity';
import { PasswordResetEntity } from './PasswordResetEntity';
import { ProfileEntity } from './ProfileEntity';
import { RefreshSessionEntity } from './RefreshSessionEntity';
import { RenditionEntity } from './RenditionEntity';
import { UserEntity } from './UserEntity';

/** Every table of the application. */
export const entities = [
  LaboratoryEntity,
  UserEntity,
  ClientEntity,
  MembershipEntity,
  InvitationEntity,
  RefreshSessionEntity,
  PasswordResetEntity,
  MailMessageEntity,
  LaserEntity,
  CameraEntity,
  BenchEntity,
  BenchRevisionEntity,
  LotEntity,
  ApertureEntity,
  CaptureEntity,
  FrameEntity,
  FrameChunkEntity,
  CaptureFrameEntity,
  MeasurementEntity,
  RenditionEntity,
  ProfileEntity,
];
