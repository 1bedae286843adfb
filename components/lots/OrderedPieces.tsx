import { View } from 'react-native';
import { Plate } from '@/components/ui/Plate';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { LotDetail } from '@/shared/contracts/lots';
import { nominalText } from './apertureWords';

/** What a client sees of a lot: the pieces as ordered, and how many of them have a size. */
export function OrderedPieces({ lot }: { lot: LotDetail }) {
  return (
    <View style={{ gap: space.hair }}>
      <Plate>
        <Text variant="strong">{`${lot.measuredCount} of ${lot.apertureCount} measured`}</Text>
        <Text variant="small" tone="ink2">
          The laboratory gives sizes out when they are released.
        </Text>
      </Plate>
      <View role="list" aria-label="Pieces" style={{ gap: space.hair }}>
        {lot.apertures.map((aperture) => (
          <View key={aperture.id} role="listitem">
            <Row
              dense
              title={aperture.serial}
              trailing={<Text tone="ink2">{nominalText(aperture.nominalSizeUm, aperture.toleranceUm)}</Text>}
            />
          </View>
        ))}
      </View>
    </View>
  );
}
