import type { ApertureBody } from '../../../shared/contracts/lots';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { ApertureEntity } from '../../entities/ApertureEntity';

export async function serialsOfLot(laboratory: LaboratoryScope, lotId: string): Promise<Set<string>> {
  const apertures = await laboratory.find(ApertureEntity, { where: { lotId } });
  return new Set(apertures.map(({ serial }) => serial));
}

export const addApertures = (laboratory: LaboratoryScope, lotId: string, bodies: ApertureBody[]): Promise<string[]> =>
  laboratory.insertAll(
    ApertureEntity,
    bodies.map((body) => ({ ...body, lotId })),
  );

export const changeAperture = (laboratory: LaboratoryScope, id: string, body: ApertureBody): Promise<number> =>
  laboratory.update(ApertureEntity, { id }, body);
