import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Ring } from '@/shared/contracts/measureResult';
import { formatMeasured, formatNumber } from '@/shared/units/format';
import { NumberPlate } from './NumberPlate';

interface Props {
  ring: Ring | null;
  ringCount: number;
  pixelPitchUm: number;
}

/** Radius of the chosen ring, the same on the sensor, and the size that it alone gives. */
export function RingPlates({ ring, ringCount, pixelPitchUm }: Props) {
  const { colours, desk } = useLook();
  if (!ring) {
    return (
      <View
        style={{
          backgroundColor: colours.plate,
          borderRadius: radius.plate,
          height: desk ? 84 : 66,
          paddingHorizontal: space.l,
          justifyContent: 'center',
        }}
      >
        <Text variant="small" tone="ink2">
          {ringCount === 0
            ? 'No dark ring was measured in this frame.'
            : 'Touch a ring in the frame or a dip in the profile.'}
        </Text>
      </View>
    );
  }
  const relative = ring.uncertaintyMm / ring.radiusMm;
  return (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      <NumberPlate
        label={`Dark ring ${ring.order}, radius`}
        value={formatMeasured(ring.radiusMm, ring.uncertaintyMm).value}
        unit="mm"
        flex={1.18}
      />
      <NumberPlate
        label="On the sensor"
        value={formatNumber((ring.radiusMm * 1000) / pixelPitchUm, { places: 1 })}
        unit="px"
      />
      <NumberPlate
        label="Size from it"
        value={formatMeasured(ring.sizeUm, ring.sizeUm * relative).value}
        unit="µm"
        flex={1.12}
      />
    </View>
  );
}
