import type { Illumination } from '@/shared/contracts/benches';
import { formatQuantity } from '@/shared/units/format';

/** Enough digits for what was typed, without the tail of binary fractions. */
export function plainQuantity(value: number, unit: string): string {
  const decimals = (String(Number(value.toPrecision(9))).split('.')[1] ?? '').length;
  return formatQuantity(value, unit, { places: decimals });
}

/** “100 ± 0.05 mm”: a value with its standard uncertainty, both as they were entered. */
export function enteredWithUncertainty(value: number, uncertainty: number, unit: string): string {
  if (uncertainty === 0) return `${plainQuantity(value, unit)}, uncertainty not given`;
  const decimals = Math.max(
    ...[value, uncertainty].map((one) => (String(Number(one.toPrecision(9))).split('.')[1] ?? '').length),
  );
  return `${value.toFixed(decimals)} ± ${formatQuantity(uncertainty, unit, { places: decimals })}`;
}

export const illuminationChoices = [
  { value: 'plane', label: 'Plane wave' },
  { value: 'diverging', label: 'Diverging from a point' },
  { value: 'gaussian', label: 'Gaussian beam' },
] as const;

export function illuminationWords(illumination: Illumination): string {
  if (illumination.kind === 'plane') return 'plane wave';
  if (illumination.kind === 'diverging')
    return `diverging, source ${plainQuantity(illumination.sourceDistanceMm, 'mm')} before the aperture`;
  return `Gaussian beam, radius ${plainQuantity(illumination.beamRadiusUm, 'µm')} at the aperture`;
}

/**
 * What to say of a laser by its class. Classes and their hazards after IEC 60825-1 (from memory); the laboratory's laser safety
 * officer and local codes come first, and no set-up is ever called safe.
 */
export function laserCaution(laserClass: string): string {
  const officer = 'What your laser safety officer and local codes say comes first.';
  switch (laserClass) {
    case '1':
    case '1M':
      return `Class ${laserClass} laser. Do not look into the beam${laserClass === '1M' ? ', least of all through optics' : ''}. ${officer}`;
    case '2':
    case '2M':
      return `Class ${laserClass} laser. Never stare into the beam or a mirror reflection${laserClass === '2M' ? ', nor view it through optics' : ''}. Close the shutter before you change the aperture. ${officer}`;
    case '3R':
      return `Class 3R laser. Keep eyes out of the beam and its mirror reflections. Close the shutter before you change the aperture. ${officer}`;
    case '3B':
      return `Class 3B laser. The beam and its reflections hurt eyes. Work in the enclosure or with the eyewear your laser safety officer rules; close the shutter before you reach in. Local codes come first.`;
    default:
      return `Class ${laserClass} laser. Even scattered light hurts eyes, and the beam burns. Only in the interlocked enclosure, as your laser safety officer rules. Local codes come first.`;
  }
}

export const cameraCaution =
  'Bare sensor: ground yourself, keep dust off, touch nothing. Too much light can spoil pixels for good: begin with the shortest exposure and an attenuator.';
