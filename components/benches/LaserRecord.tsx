import { Caution } from '@/components/ui/Caution';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Screen, type ScreenSide } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import type { Laser } from '@/shared/contracts/benches';
import { enteredWithUncertainty, laserCaution, plainQuantity } from './benchWords';

/** A laser, for those who may not change it. */
export function LaserRecord({ laser, list }: { laser: Laser; list: ScreenSide }) {
  return (
    <Screen
      title={laser.name}
      subtitle="A manager may change it"
      back="/bench"
      list={list}
      wavelengthNm={laser.wavelengthNm}
    >
      <Section title="Laser">
        <KeyValueList
          entries={[
            ['Wavelength in air', enteredWithUncertainty(laser.wavelengthNm, laser.wavelengthUncertaintyNm, 'nm')],
            ['Class', laser.laserClass],
            ['Power', laser.powerMw === null ? 'not given' : plainQuantity(laser.powerMw, 'mW')],
            ['Serial', laser.serial || '–'],
            ['Note', laser.note || '–'],
          ]}
        />
      </Section>
      <Caution icon="eyewear">{laserCaution(laser.laserClass)}</Caution>
    </Screen>
  );
}
