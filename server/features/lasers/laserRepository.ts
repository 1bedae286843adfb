import type { LaserBody } from '../../../shared/contracts/benches';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { LaserEntity } from '../../entities/LaserEntity';

export const readLasers = (laboratory: LaboratoryScope): Promise<LaserEntity[]> =>
  laboratory.find(LaserEntity, { order: { name: 'ASC' } });

export const readLaser = (laboratory: LaboratoryScope, id: string): Promise<LaserEntity | null> =>
  laboratory.findOne(LaserEntity, { where: { id } });

export const addLaser = (laboratory: LaboratoryScope, body: LaserBody): Promise<string> =>
  laboratory.insert(LaserEntity, body);

export const changeLaser = (laboratory: LaboratoryScope, id: string, body: LaserBody): Promise<number> =>
  laboratory.update(LaserEntity, { id }, body);
