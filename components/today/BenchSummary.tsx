import { View } from 'react-native';
import {
  enteredWithUncertainty,
  illuminationWords,
  laserCaution,
  plainQuantity,
} from '@/components/benches/benchWords';
import { Caution } from '@/components/ui/Caution';
import { ChoiceField } from '@/components/ui/ChoiceField';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Plate } from '@/components/ui/Plate';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { Bench } from '@/shared/contracts/benches';
import { THIN_SPACE } from '@/shared/units/format';

export interface BenchSummaryProps {
  bench: Bench;
  benches: readonly Bench[];
  onChoose: (benchId: string) => void;
  /** Only the numbers and the caution, for a phone. */
  short?: boolean;
}

/** The bench at which this device stands. */
export function BenchSummary({ bench, benches, onChoose, short }: BenchSummaryProps) {
  const { laser, camera, distanceMm, distanceUncertaintyMm, illumination } = bench.current;
  const figures = [
    ['Distance', distanceMm, 'mm'],
    ['Wavelength', laser.wavelengthNm, 'nm'],
    ['Pixel pitch', camera.pixelPitchUm, 'µm'],
  ] as const;
  return (
    <View style={{ gap: space.hair }}>
      {benches.length > 1 ? (
        <Plate style={{ paddingVertical: space.s }}>
          <ChoiceField
            label="This device stands at"
            value={bench.id}
            choices={benches.map((one) => ({
              value: one.id,
              label: `${one.name}, ${plainQuantity(one.current.laser.wavelengthNm, 'nm')}`,
            }))}
            onChange={onChoose}
          />
        </Plate>
      ) : null}
      <View style={{ flexDirection: 'row', gap: space.hair }}>
        {figures.map(([label, value, unit]) => (
          <Plate key={label} style={{ flexGrow: 1, flexShrink: 1, paddingVertical: 10, paddingHorizontal: 14 }}>
            <Text variant="label" lines={1}>
              {label}
            </Text>
            <Text variant="medium" lines={1} style={{ fontSize: 20 }}>
              {Number(value.toPrecision(7))}
              <Text style={{ fontSize: 14 }}>{`${THIN_SPACE}${unit}`}</Text>
            </Text>
          </Plate>
        ))}
      </View>
      <Caution icon="eyewear">{laserCaution(laser.laserClass)}</Caution>
      {short ? null : (
        <Section title="On this bench">
          <KeyValueList
            entries={[
              ['Laser', `${laser.name}, class ${laser.laserClass}`],
              ['Wavelength in air', enteredWithUncertainty(laser.wavelengthNm, laser.wavelengthUncertaintyNm, 'nm')],
              ['Distance', enteredWithUncertainty(distanceMm, distanceUncertaintyMm, 'mm')],
              ['Illumination', illuminationWords(illumination)],
              ['Camera', `${camera.name}, ${camera.bitDepth} bit`],
              ['Pixels', `${camera.widthPx} × ${camera.heightPx}, ${plainQuantity(camera.pixelPitchUm, 'µm')}`],
              [
                'Cover glass',
                camera.coverGlassMm === null || camera.coverGlassMm === 0
                  ? 'none'
                  : plainQuantity(camera.coverGlassMm, 'mm'),
              ],
            ]}
          />
        </Section>
      )}
    </View>
  );
}
