import { formatQuantity } from '@/shared/units/format';
import { warningFlags, type BudgetLine, type BudgetSource, type Flag } from '@/shared/contracts/measureResult';
import { NEAR_FIELD_FRESNEL_NUMBER } from '@/shared/optics/fresnelNumber';

export interface FlagWords {
  name: string;
  means: string;
  /** The line of the budget that carries what it costs, where there is one. */
  source: BudgetSource | null;
}

const words: Record<Flag, FlagWords> = {
  'no-darks': { name: 'No dark frames', means: 'The black level is estimated from the frame itself.', source: null },
  'no-flat': { name: 'No flat frame', means: 'Pixel response is taken as even.', source: 'pixel-response' },
  'clipped-core': {
    name: 'Core clipped',
    means: 'The middle is at full scale and left out. The rings carry the size.',
    source: null,
  },
  cropped: { name: 'Pattern cropped', means: 'Part of the pattern lies beyond the edge of the sensor.', source: null },
  'near-field': {
    name: 'Near field',
    means: `At a Fresnel number of ${NEAR_FIELD_FRESNEL_NUMBER} or more the first dark ring no longer goes dark. The model includes this.`,
    source: 'model',
  },
  'camera-rendered': {
    name: 'Rendered by the camera',
    means: 'The camera changed the tones. Ring positions carry the size.',
    source: 'model',
  },
  'low-signal': { name: 'Low signal', means: 'The outer rings are close to the noise.', source: 'fit' },
  mosaic: {
    name: 'Colour sensor',
    means: 'Only the pixels of the colour that responds to the laser are used.',
    source: null,
  },
  'no-second-opinion': {
    name: 'No second opinion',
    means: 'The size by transform cannot be had from this frame.',
    source: null,
  },
  'wrong-pattern': {
    name: 'Pattern in doubt',
    means: 'The pattern may be that of another kind of aperture.',
    source: 'model',
  },
  'second-pattern': {
    name: 'Second pattern',
    means: 'A weaker pattern lies over the first, as a reflection makes it.',
    source: 'model',
  },
  'out-of-round': { name: 'Out of round', means: 'The size changes with the angle. See shape.', source: null },
  'tilted-sensor': {
    name: 'Sensor tilted',
    means: 'The rings are stretched as a tilted sensor stretches them.',
    source: 'tilt',
  },
  'uneven-illumination': {
    name: 'Uneven illumination',
    means: 'The aperture is not lit evenly.',
    source: 'illumination',
  },
  'stray-light': { name: 'Stray light', means: 'Light that is not of the pattern lies on the frame.', source: null },
  fringes: {
    name: 'Fringes',
    means: 'Straight interference fringes lie over the pattern, as a window or filter makes them.',
    source: null,
  },
  dust: {
    name: 'Dust',
    means: 'Spots of dust are left out of the fit. Clean the sensor or cover glass.',
    source: null,
  },
  'hot-pixels': { name: 'Hot pixels', means: 'Pixels that glow by themselves are left out of the fit.', source: null },
  'under-sampled': {
    name: 'Rings fine',
    means: 'A ring is only a few pixels wide. A longer distance would widen them.',
    source: 'fit',
  },
  motion: { name: 'Motion', means: 'The pattern moved during the exposure.', source: null },
  'opinions-disagree': {
    name: 'The ways disagree',
    means: 'The size by the rings or by transform is further off than their uncertainties allow.',
    source: null,
  },
  'poor-fit': { name: 'Poor fit', means: 'The model leaves more misfit than the noise explains.', source: 'model' },
};

export interface FlagSaid {
  flag: Flag;
  name: string;
  text: string;
  /** A warning is to be looked at; a note only says how the number came about. */
  warning: boolean;
}

/** A flag in words, with its part of the standard uncertainty where the budget knows it. Warnings first. */
export function sayFlags(flags: readonly Flag[], budget: readonly BudgetLine[]): FlagSaid[] {
  const said = flags.map((flag): FlagSaid => {
    const { name, means, source } = words[flag];
    const line =
      source === null ? undefined : budget.find((entry) => entry.source === source && entry.contributionUm > 0);
    const cost = line
      ? ` Its part of the uncertainty is ${formatQuantity(line.contributionUm, 'µm', { significant: 2 })}.`
      : '';
    return { flag, name, text: means + cost, warning: warningFlags.some((warning) => warning === flag) };
  });
  return [...said.filter((s) => s.warning), ...said.filter((s) => !s.warning)];
}
