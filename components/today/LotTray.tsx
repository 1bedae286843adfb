import { View } from 'react-native';
import { apertureLimits, readAperture } from '@/components/lots/apertureReading';
import { Slot } from '@/components/ui/Slot';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import type { Aperture } from '@/shared/contracts/lots';
import { formatMeasured } from '@/shared/units/format';

export interface LotTrayProps {
  lotId: string;
  apertures: readonly Aperture[];
  nextId: string;
}

/** The pieces of a lot as they lie in their box. */
export function LotTray({ lotId, apertures, nextId }: LotTrayProps) {
  const { colours } = useLook();
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.hair }}>
      {apertures.map((aperture) => {
        const reading = readAperture(aperture);
        const isNext = aperture.id === nextId;
        const untouched = reading.stage === 'waiting';
        const size = aperture.newest?.sizeUm ?? null;
        const uncertainty = aperture.newest?.expandedUncertaintyUm ?? null;
        return (
          <Touch
            key={aperture.id}
            href={`/lots/${lotId}?aperture=${aperture.id}`}
            style={({ pressed }) => ({
              flexGrow: 1,
              flexBasis: 128,
              maxWidth: 220,
              height: 124,
              padding: 12,
              justifyContent: 'space-between',
              borderRadius: radius.plate,
              backgroundColor: untouched && !pressed ? colours.well : colours.lift,
              borderWidth: 2,
              borderColor: isNext ? colours.accent : 'transparent',
            })}
          >
            <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center', gap: 4 }}>
              <Text variant="strong" tone={untouched && !isNext ? 'ink2' : 'ink0'} lines={1} style={{ flexShrink: 1 }}>
                {aperture.serial}
              </Text>
              <StageGlyph stage={reading.stage} size={22} />
            </View>
            {size !== null ? (
              <View style={{ gap: 6 }}>
                <Text variant="medium" style={{ fontSize: 22, lineHeight: 26 }} lines={1}>
                  {formatMeasured(size, uncertainty).value}
                </Text>
                {aperture.toleranceUm === null ? null : (
                  <Slot
                    {...apertureLimits(aperture)}
                    value={size}
                    uncertainty={uncertainty}
                    size="sm"
                    label={reading.words}
                  />
                )}
              </View>
            ) : isNext ? (
              <Text variant="strong" tone="accent">
                next
              </Text>
            ) : (
              <Text variant="small" lines={2}>
                {untouched ? '' : reading.words}
              </Text>
            )}
          </Touch>
        );
      })}
    </View>
  );
}
