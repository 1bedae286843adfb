import { Slot } from '@/components/ui/Slot';
import type { CaptureFrame } from '@/shared/contracts/captures';
import { formatPercent } from '@/shared/units/format';
import type { StyleProp, ViewStyle } from 'react-native';

/**
 * The walls between which the peak of a frame should lie, as parts of the range from black to white: under the lower one
 * the outer rings drown in noise, over the upper one the core is about to clip. Common practice.
 */
export const PEAK_LOW = 0.25;
export const PEAK_HIGH = 0.95;

/** The peak of a frame in its gap between noise and clipping. */
export function PeakSlot({
  health,
  style,
}: {
  health: NonNullable<CaptureFrame['health']>;
  style?: StyleProp<ViewStyle>;
}) {
  const place =
    health.peakFraction < PEAK_LOW ? 'low' : health.peakFraction > PEAK_HIGH ? 'near clipping' : 'in its gap';
  return (
    <Slot
      size="sm"
      lower={PEAK_LOW}
      upper={PEAK_HIGH}
      value={health.peakFraction}
      label={`Peak at ${formatPercent(health.peakFraction, { places: 0 })} of full scale, ${place}`}
      style={style}
    />
  );
}
