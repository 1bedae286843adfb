import { View } from 'react-native';
import { Flag } from '@/components/ui/Flag';
import { Plate } from '@/components/ui/Plate';
import { formatPercent } from '@/shared/units/format';
import type { CompareLineResult, SizeBasis } from './compareLine';

/** Pieces that do not lie on the line, and what that says. */
export function OutlierFlags({ line, basis }: { line: CompareLineResult; basis: SizeBasis }) {
  const { outliers, strangers, ringless } = line;
  if (outliers.length + strangers.length + ringless.length === 0) return null;
  return (
    <Plate>
      <View role="list">
        {outliers.map(({ measurementId, serial, offset, ringCount }) => (
          <View key={measurementId} role="listitem">
            <Flag
              title={`${serial} is off the line`}
              detail={`${ringCount === 1 ? 'Its ring is' : `All ${ringCount} rings together are`} ${formatPercent(Math.abs(offset), { significant: 2 })} too ${offset > 0 ? 'wide' : 'narrow'}. Its ${basis === 'nominal' ? 'nominal' : 'stated'} size is in doubt rather than the bench. It is left out of the line.`}
            />
          </View>
        ))}
        {strangers.map(({ measurementId, serial }) => (
          <View key={measurementId} role="listitem">
            <Flag
              title={`${serial} has another bench constant`}
              detail="Its wavelength or distance differs from that of the first one chosen. It is left out of the line."
            />
          </View>
        ))}
        {ringless.map(({ measurementId, serial }) => (
          <View key={measurementId} role="listitem">
            <Flag
              title={`${serial} has no dark ring to compare`}
              detail="No dark ring of its pattern lies on the sensor. A shorter distance brings them in."
            />
          </View>
        ))}
      </View>
    </Plate>
  );
}
