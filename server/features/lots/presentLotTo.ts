import type { Lot, LotDetail } from '../../../shared/contracts/lots';
import type { Role } from '../../../shared/contracts/roles';

/**
 * A lot as a role may see it. A client follows how far its lot has come; notes, refusals and sizes stay in the
 * laboratory until they are released.
 */
export function presentLotTo(role: Role, lot: Lot): Lot {
  return role === 'client' ? { ...lot, note: '', refusedCount: 0 } : lot;
}

export function presentLotDetailTo(role: Role, lot: LotDetail): LotDetail {
  if (role !== 'client') return lot;
  const apertures = lot.apertures.map((aperture) => ({ ...aperture, note: '', newest: null }));
  return { ...lot, ...presentLotTo(role, lot), apertures };
}
