import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import type { CaptureFrame } from '@/shared/contracts/captures';

interface Props {
  frames: readonly CaptureFrame[];
  chosenId: string;
  onChoose: (captureFrameId: string) => void;
  /** Draws the small picture of a frame. */
  thumbnail: (frame: CaptureFrame) => ReactNode;
}

const SIDE_PX = 106;

/** The frames of the capture, one under the other. */
export function FilmStrip({ frames, chosenId, onChoose, thumbnail }: Props) {
  const { colours } = useLook();
  return (
    <View role="navigation" aria-label="Frames of the capture" style={{ width: 112 }}>
      <ScrollView contentContainerStyle={{ gap: space.hair }}>
        {frames.map((frame, i) => {
          const chosen = frame.id === chosenId;
          const clipped = (frame.health?.clippedFraction ?? 0) > 0.001;
          const word =
            frame.state === 'unusable'
              ? ' unusable'
              : frame.kind !== 'light'
                ? ` ${frame.kind}`
                : clipped
                  ? ' clipped'
                  : '';
          return (
            <Touch
              key={frame.id}
              label={`Frame ${i + 1}${word}, ${frame.name}`}
              current={chosen}
              onPress={() => onChoose(frame.id)}
              style={{
                height: SIDE_PX,
                backgroundColor: colours.plate,
                borderRadius: radius.plate,
                overflow: 'hidden',
              }}
            >
              {thumbnail(frame)}
              <View
                style={{
                  position: 'absolute',
                  left: 0,
                  bottom: 0,
                  paddingHorizontal: 8,
                  paddingVertical: 3,
                  backgroundColor: colours.gap,
                  opacity: 0.86,
                }}
              >
                <Text variant="label" tone="ink0">{`${i + 1}${word}`}</Text>
              </View>
              {chosen ? (
                <View
                  style={{
                    position: 'absolute',
                    inset: 0,
                    borderWidth: 3,
                    borderColor: colours.ink0,
                    borderRadius: radius.plate,
                    pointerEvents: 'none',
                  }}
                />
              ) : null}
            </Touch>
          );
        })}
      </ScrollView>
    </View>
  );
}
