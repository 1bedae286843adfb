import type { Laser } from '../../../shared/contracts/benches';
import type { LaserEntity } from '../../entities/LaserEntity';

export function presentLaser(laser: LaserEntity): Laser {
  return {
    id: laser.id,
    name: laser.name,
    serial: laser.serial,
    wavelengthNm: laser.wavelengthNm,
    wavelengthUncertaintyNm: laser.wavelengthUncertaintyNm,
    laserClass: laser.laserClass,
    powerMw: laser.powerMw,
    note: laser.note,
    createdAt: laser.createdAt.toISOString(),
  };
}
