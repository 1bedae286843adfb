import type { CameraBody } from '../../../shared/contracts/benches';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { CameraEntity } from '../../entities/CameraEntity';

export const readCameras = (laboratory: LaboratoryScope): Promise<CameraEntity[]> =>
  laboratory.find(CameraEntity, { order: { name: 'ASC' } });

export const readCamera = (laboratory: LaboratoryScope, id: string): Promise<CameraEntity | null> =>
  laboratory.findOne(CameraEntity, { where: { id } });

export const addCamera = (laboratory: LaboratoryScope, body: CameraBody): Promise<string> =>
  laboratory.insert(CameraEntity, body);

export const changeCamera = (laboratory: LaboratoryScope, id: string, body: CameraBody): Promise<number> =>
  laboratory.update(CameraEntity, { id }, body);
