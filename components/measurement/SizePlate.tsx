import { View } from 'react-native';
import { HeroNumber } from '@/components/ui/HeroNumber';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import type { Measured } from '@/shared/contracts/measureResult';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { formatDateTime, formatMeasured, formatNumber } from '@/shared/units/format';
import { ToleranceLine } from './ToleranceLine';

/** The size with its uncertainty, and where it lies in its tolerance. */
export function SizePlate({ measurement, measured }: { measurement: MeasurementDetail; measured: Measured }) {
  const { desk } = useLook();
  const size = formatMeasured(measured.sizeUm, measured.expandedUncertaintyUm);
  const darks = measurement.darkCount === 1 ? '1 dark' : `${measurement.darkCount} darks`;
  const k =
    measured.coverageFactor === null ? null : `k = ${formatNumber(measured.coverageFactor, { places: 2 })}, 95 %`;
  return (
    <Plate>
      {desk ? (
        <Text tone="ink2" style={{ marginBottom: 4 }}>
          {`Measured ${formatDateTime(measurement.finishedAt)} by ${measurement.createdBy}, ${measurement.benchName} revision ${measurement.benchRevision}`}
        </Text>
      ) : null}
      <HeroNumber
        value={size.value}
        uncertainty={size.uncertainty ?? undefined}
        unit="µm"
        note={[k, `one frame, ${measurement.darkCount === 0 ? 'no darks' : darks}`]
          .filter((part) => part !== null)
          .join('\n')}
      />
      <View style={{ marginTop: 14 }}>
        {measured.sizeUm === null ? null : (
          <ToleranceLine
            sizeUm={measured.sizeUm}
            standardUncertaintyUm={measured.standardUncertaintyUm}
            expandedUncertaintyUm={measured.expandedUncertaintyUm}
            nominalSizeUm={measurement.nominalSizeUm}
            toleranceUm={measurement.toleranceUm}
          />
        )}
      </View>
    </Plate>
  );
}
