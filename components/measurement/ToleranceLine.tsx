import { View } from 'react-native';
import { Slot } from '@/components/ui/Slot';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { VerdictGlyph } from '@/components/ui/VerdictGlyph';
import { formatMeasuredText, formatNumber } from '@/shared/units/format';
import { asEntered } from './asEntered';
import { tolerancePosition } from './tolerancePosition';

export interface ToleranceLineProps {
  sizeUm: number;
  standardUncertaintyUm: number | null;
  expandedUncertaintyUm: number | null;
  nominalSizeUm: number;
  /** Null: none agreed, then nothing is drawn. */
  toleranceUm: number | null;
}

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** Decimals that both limits need, so that 99.5 is not drawn as 100. */
function decimalsOf(...limits: number[]): number {
  for (let decimals = 0; decimals < 4; decimals++) {
    if (limits.every((limit) => Math.abs(limit * 10 ** decimals - Math.round(limit * 10 ** decimals)) < 1e-6))
      return decimals;
  }
  return 4;
}

/** The size in its tolerance: where it lies, and how the named rule reads it before anybody has reviewed it. */
export function ToleranceLine({
  sizeUm,
  standardUncertaintyUm,
  expandedUncertaintyUm,
  nominalSizeUm,
  toleranceUm,
}: ToleranceLineProps) {
  const { desk } = useLook();
  if (toleranceUm === null || toleranceUm <= 0) {
    return (
      <Text variant="small" tone="ink2">
        {`Nominal ${asEntered(nominalSizeUm)} µm. No tolerance agreed.`}
      </Text>
    );
  }
  const { lower, upper, words, reading } = tolerancePosition(sizeUm, standardUncertaintyUm, nominalSizeUm, toleranceUm);
  const margin = desk ? -20 : -space.l;
  return (
    <View>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 11 }}>
        <VerdictGlyph verdict={reading?.place ?? 'open'} scale={1.25} />
        <View
          style={
            desk
              ? { flex: 1, flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center', gap: space.m }
              : { flex: 1 }
          }
        >
          <Text variant="strong">{sentence(words)}</Text>
          <Text variant="small" tone="ink2">
            {reading?.words ?? 'Not reviewed.'}
          </Text>
        </View>
      </View>
      <Slot
        size="lg"
        lower={lower}
        upper={upper}
        value={sizeUm}
        uncertainty={expandedUncertaintyUm}
        guard={reading && reading.guardBandUm < toleranceUm ? reading.guardBandUm : 0}
        nominal={nominalSizeUm}
        decimals={Math.max(decimalsOf(lower, upper), nominalSizeUm < 1000 ? 1 : 0)}
        label={`${formatMeasuredText(sizeUm, expandedUncertaintyUm, 'µm')}, ${words}, limits ${formatNumber(lower)} and ${formatNumber(upper)} µm`}
        style={{ marginHorizontal: margin, marginTop: 6 }}
      />
    </View>
  );
}
