import type { BudgetSource } from '@/shared/contracts/measureResult';

const names: Record<BudgetSource, string> = {
  fit: 'Fit',
  'pixel-response': 'Pixel response',
  illumination: 'Illumination',
  'repeat-frames': 'Repeat frames',
  wavelength: 'Wavelength',
  distance: 'Distance',
  'pixel-pitch': 'Pixel pitch',
  'cover-glass': 'Cover glass',
  tilt: 'Tilt of sensor',
  model: 'Model',
};

/** Cause of uncertainty, as it stands in the budget. */
export const sourceName = (source: BudgetSource): string => names[source];
