import { useState } from 'react';
import { View } from 'react-native';
import { nominalText } from '@/components/lots/apertureWords';
import { readAperture } from '@/components/lots/apertureReading';
import { Button } from '@/components/ui/Button';
import { Plate } from '@/components/ui/Plate';
import { ProgressRing, type RingSegment } from '@/components/ui/ProgressRing';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Aperture } from '@/shared/contracts/lots';
import type { Today } from '@/shared/contracts/today';

export interface NextApertureProps {
  next: NonNullable<Today['next']>;
  /** Pieces of the lot, as far as they are known. */
  apertures: readonly Aperture[];
  clientName: string | null;
  due: string | null;
  mayCapture: boolean;
}

function segmentOf(aperture: Aperture): RingSegment {
  const { stage } = readAperture(aperture);
  if (stage === 'failed') return { state: 'refused' };
  return { state: stage === 'measured' || stage === 'refused' || stage === 'measuring' ? stage : 'waiting' };
}

/** The piece that is to be measured next, and the way to it. */
export function NextAperture({ next, apertures, clientName, due, mayCapture }: NextApertureProps) {
  const { desk } = useLook();
  const [width, setWidth] = useState(0);
  const segments = apertures.map(segmentOf);
  const left = segments.filter((segment) => segment.state !== 'measured').length;
  const room = desk ? width : width - 108;
  const size = Math.max(24, Math.min(desk ? 76 : 40, Math.floor(room / (next.serial.length * 0.74))));
  return (
    <View style={{ gap: desk ? space.hair : 0 }}>
      <Plate>
        <View
          onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
          style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'flex-start', gap: space.m }}
        >
          <View style={{ flex: 1, minWidth: 0 }}>
            <Text variant="label">Next on the bench</Text>
            <Text
              variant="large"
              lines={1}
              style={{
                fontSize: size,
                lineHeight: Math.round(size * 1.1),
                letterSpacing: -0.035 * size,
                marginLeft: -Math.round(size * 0.05),
                marginTop: 4,
              }}
            >
              {next.serial}
            </Text>
            <Text style={{ marginTop: 6 }}>
              {`${nominalText(next.nominalSizeUm, next.toleranceUm)} `}
              <Text tone="ink2">{[`lot ${next.lotNumber}`, clientName, due].filter(Boolean).join(', ')}</Text>
            </Text>
          </View>
          {!desk && segments.length > 0 ? (
            <ProgressRing
              segments={segments}
              size={92}
              label={`${left} of ${segments.length} pieces of lot ${next.lotNumber} left`}
            >
              <Text variant="medium">{left}</Text>
              <Text variant="label">left</Text>
            </ProgressRing>
          ) : null}
        </View>
      </Plate>
      {mayCapture ? (
        <Button
          label="Take frames"
          kind="primary"
          icon="capture"
          fullBleed={!desk}
          href={`/capture?aperture=${next.apertureId}`}
          testID="take-frames"
        />
      ) : null}
    </View>
  );
}
