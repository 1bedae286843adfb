import { Caution } from '@/components/ui/Caution';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Screen, type ScreenSide } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import type { Camera } from '@/shared/contracts/benches';
import { cameraCaution, enteredWithUncertainty, plainQuantity } from './benchWords';

/** A camera, for those who may not change it. */
export function CameraRecord({ camera, list }: { camera: Camera; list: ScreenSide }) {
  const known = (value: number | null, unit: string) =>
    value === null ? 'found from the frames' : plainQuantity(value, unit);
  return (
    <Screen title={camera.name} subtitle="A manager may change it" back="/bench" list={list}>
      <Section title="Camera">
        <KeyValueList
          entries={[
            ['Pixels', `${camera.widthPx} × ${camera.heightPx}`],
            ['Pixel pitch', enteredWithUncertainty(camera.pixelPitchUm, camera.pixelPitchUncertaintyUm, 'µm')],
            ['Significant bits', String(camera.bitDepth)],
            ['Gain', known(camera.electronsPerCount, 'e per count')],
            ['Read noise', known(camera.readNoiseElectrons, 'e')],
            ['Black level', known(camera.blackCount, 'counts')],
            ['White level', known(camera.whiteCount, 'counts')],
            [
              'Cover glass',
              camera.coverGlassMm === null || camera.coverGlassMm === 0
                ? 'none'
                : `${plainQuantity(camera.coverGlassMm, 'mm')}, index ${camera.coverGlassIndex ?? '–'}`,
            ],
            ['Serial', camera.serial || '–'],
            ['Note', camera.note || '–'],
          ]}
        />
      </Section>
      <Caution>{cameraCaution}</Caution>
    </Screen>
  );
}
