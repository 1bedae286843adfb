import { View } from 'react-native';
import { Plate } from '@/components/ui/Plate';
import { Slot } from '@/components/ui/Slot';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { formatMeasured, formatMeasuredText, formatQuantity } from '@/shared/units/format';
import type { SlopeSays } from './benchSays';
import type { SizeBasis } from './compareLine';

export interface SlopeAnswerProps {
  says: SlopeSays;
  basis: SizeBasis;
  benchName: string;
  /** Standard uncertainty of the bench's distance, where it is known. */
  benchUncertaintyMm: number | null;
}

/** What the slope says of the bench: the distance, beside the one that was entered. */
export function SlopeAnswer({ says, basis, benchName, benchUncertaintyMm }: SlopeAnswerProps) {
  const { desk } = useLook();
  const expanded = says.distanceUncertaintyMm === null ? null : 2 * says.distanceUncertaintyMm;
  const text = formatMeasured(says.distanceMm, expanded);
  const apart = says.distanceMm - says.benchDistanceMm;
  const wall = benchUncertaintyMm === null ? null : 2 * benchUncertaintyMm;
  const both = expanded === null || wall === null ? null : Math.hypot(expanded, wall);
  const agreement =
    both === null
      ? `They differ by ${formatQuantity(Math.abs(apart), 'mm', { significant: 2 })}.`
      : Math.abs(apart) <= both
        ? 'They agree within their uncertainties.'
        : `They differ by ${formatQuantity(Math.abs(apart), 'mm', { significant: 2 })}, more than their uncertainties allow.`;
  if (basis === 'measured') {
    return (
      <Plate>
        <Text variant="strong">The bench is not tested here</Text>
        <Text variant="small">
          Measured sizes rest on the distance of this bench, so their line gives that distance back. It shows whether
          rings and sizes belong together. Take nominal sizes to test the distance.
        </Text>
      </Plate>
    );
  }
  return (
    <Plate>
      <Text variant="label">Distance, from the slope</Text>
      <Text
        variant="hero"
        lines={1}
        style={{ fontSize: desk ? 58 : 40, lineHeight: desk ? 62 : 44, letterSpacing: -2, marginLeft: -3 }}
      >
        {text.value}
      </Text>
      <Text variant="medium">{text.uncertainty === null ? 'mm' : `±\u2009${text.uncertainty}\u2009mm`}</Text>
      <View style={{ marginTop: space.m, gap: 4 }}>
        <Text variant="label">{`${benchName} says`}</Text>
        <Text variant="medium">{formatMeasuredText(says.benchDistanceMm, wall, 'mm')}</Text>
        <Text variant="strong">{agreement}</Text>
      </View>
      {wall === null ? null : (
        <Slot
          size="lg"
          lower={says.benchDistanceMm - wall}
          upper={says.benchDistanceMm + wall}
          value={says.distanceMm}
          uncertainty={expanded}
          nominal={says.benchDistanceMm}
          decimals={2}
          label={`Distance from the slope ${formatMeasuredText(says.distanceMm, expanded, 'mm')}, the bench says ${formatMeasuredText(says.benchDistanceMm, wall, 'mm')}`}
          style={{ marginHorizontal: desk ? -20 : -16, marginTop: 4 }}
        />
      )}
      <Text variant="small" tone="ink2">
        Nominal sizes are taken as true. ± stands for k = 2, about 95 %.
      </Text>
    </Plate>
  );
}
