import { View } from 'react-native';
import { Caution } from '@/components/ui/Caution';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Plate } from '@/components/ui/Plate';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { BenchRevision } from '@/shared/contracts/benches';
import { THIN_SPACE } from '@/shared/units/format';
import { cameraCaution, enteredWithUncertainty, illuminationWords, laserCaution, plainQuantity } from './benchWords';

/** A bench as it stands now: the numbers a size is made of, the laser, the camera, and what to be careful of. */
export function BenchPanel({ revision }: { revision: BenchRevision }) {
  const { laser, camera } = revision;
  return (
    <View style={{ gap: space.hair }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.hair }}>
        <Figure label="Distance" value={revision.distanceMm} unit="mm" />
        <Figure label="Wavelength in air" value={laser.wavelengthNm} unit="nm" />
        <Figure label="Pixel pitch" value={camera.pixelPitchUm} unit="µm" />
      </View>
      <Caution icon="eyewear">{laserCaution(laser.laserClass)}</Caution>
      <Section title="What a size is made of" note="With standard uncertainties (k = 1)">
        <KeyValueList
          entries={[
            [
              'Distance, aperture to sensor',
              enteredWithUncertainty(revision.distanceMm, revision.distanceUncertaintyMm, 'mm'),
            ],
            ['Wavelength in air', enteredWithUncertainty(laser.wavelengthNm, laser.wavelengthUncertaintyNm, 'nm')],
            ['Pixel pitch', enteredWithUncertainty(camera.pixelPitchUm, camera.pixelPitchUncertaintyUm, 'µm')],
            [
              'Cover glass',
              camera.coverGlassMm === null || camera.coverGlassMm === 0
                ? 'none'
                : `${plainQuantity(camera.coverGlassMm, 'mm')}, index ${camera.coverGlassIndex ?? '–'}`,
            ],
            ['Illumination', illuminationWords(revision.illumination)],
          ]}
        />
      </Section>
      <Section title="Laser">
        <KeyValueList
          entries={[
            ['Name', laser.name],
            ['Serial', laser.serial || '–'],
            ['Class', laser.laserClass],
            ['Power', laser.powerMw === null ? 'not given' : plainQuantity(laser.powerMw, 'mW')],
          ]}
        />
      </Section>
      <Section title="Camera">
        <KeyValueList
          entries={[
            ['Name', camera.name],
            ['Serial', camera.serial || '–'],
            ['Pixels', `${camera.widthPx} × ${camera.heightPx}`],
            [
              'Sensor',
              `${((camera.widthPx * camera.pixelPitchUm) / 1000).toFixed(2)} × ${((camera.heightPx * camera.pixelPitchUm) / 1000).toFixed(2)}${THIN_SPACE}mm`,
            ],
            ['Significant bits', String(camera.bitDepth)],
            [
              'Gain',
              camera.electronsPerCount === null
                ? 'found from the frames'
                : `${camera.electronsPerCount} electrons per count`,
            ],
            [
              'Read noise',
              camera.readNoiseElectrons === null
                ? 'found from the frames'
                : plainQuantity(camera.readNoiseElectrons, 'electrons'),
            ],
          ]}
        />
      </Section>
      <Caution>{cameraCaution}</Caution>
    </View>
  );
}

function Figure({ label, value, unit }: { label: string; value: number; unit: string }) {
  return (
    <Plate style={{ flexGrow: 1, flexBasis: 104, minWidth: 0, paddingVertical: 10, paddingHorizontal: 14 }}>
      <Text variant="label" lines={1}>
        {label}
      </Text>
      <Text variant="medium" lines={1}>
        {Number(value.toPrecision(8))}
        <Text style={{ fontSize: 15 }}>{`${THIN_SPACE}${unit}`}</Text>
      </Text>
    </Plate>
  );
}
