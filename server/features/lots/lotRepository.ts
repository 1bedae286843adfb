import type { LotBody } from '../../../shared/contracts/lots';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { LotEntity } from '../../entities/LotEntity';

/** Holds the lot's row until the transaction ends; returns whether there is such a lot. */
export async function lockLot(laboratory: LaboratoryScope, id: string): Promise<boolean> {
  return (await laboratory.findOne(LotEntity, { where: { id }, lock: 'update' })) !== null;
}

export const addLot = (laboratory: LaboratoryScope, body: LotBody): Promise<string> =>
  laboratory.insert(LotEntity, body);

export const changeLot = (laboratory: LaboratoryScope, id: string, body: LotBody): Promise<number> =>
  laboratory.update(LotEntity, { id }, body);
