import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';

/** Where frames come from. */
export type FrameOrigin = 'camera' | 'library' | 'files';

export interface CaptureFootProps {
  /** `dark`: what comes is a dark, whatever its name; null: its name decides. */
  onTake: (origin: FrameOrigin, kind: 'dark' | null) => void;
}

/** Foot of a capture on a phone or tablet: snap at once, or choose stills or darks from somewhere. */
export function CaptureFoot({ onTake }: CaptureFootProps) {
  const { colours } = useLook();
  const [asked, setAsked] = useState<'stills' | 'dark' | null>(null);
  const take = (origin: FrameOrigin) => {
    const kind = asked === 'dark' ? 'dark' : null;
    setAsked(null);
    onTake(origin, kind);
  };
  const toggle = (which: 'stills' | 'dark') => setAsked(asked === which ? null : which);
  return (
    <View style={{ gap: space.hair, paddingTop: space.hair, backgroundColor: colours.gap }}>
      {asked ? (
        <View role="group" aria-label={asked === 'dark' ? 'Add darks' : 'Add stills'} style={{ gap: space.hair }}>
          {asked === 'dark' ? (
            <Row
              icon="snap"
              title="Snap a dark"
              subtitle="Shutter closed, same exposure"
              onPress={() => take('camera')}
            />
          ) : null}
          <Row
            icon="stills"
            title="From the library"
            subtitle="Pictures on this phone"
            onPress={() => take('library')}
          />
          <Row
            icon="put"
            title="From files"
            subtitle="TIFF, PNG or JPEG stills of a camera"
            onPress={() => take('files')}
          />
        </View>
      ) : null}
      <View style={{ flexDirection: 'row', gap: space.hair }}>
        <Button
          label="Snap"
          kind="primary"
          icon="snap"
          trailing={null}
          fullBleed
          onPress={() => {
            setAsked(null);
            onTake('camera', null);
          }}
          style={{ flex: 1, minHeight: 70 }}
        />
        <Button
          label="Add stills"
          icon="stills"
          fullBleed
          onPress={() => toggle('stills')}
          style={{ flex: 1.08, minHeight: 70 }}
        />
        <Touch
          label="Add darks"
          expanded={asked === 'dark'}
          onPress={() => toggle('dark')}
          style={({ pressed }) => ({
            width: 72,
            minHeight: 70,
            alignItems: 'center',
            justifyContent: 'center',
            gap: 3,
            backgroundColor: pressed ? colours.rule : colours.lift,
          })}
        >
          <Icon name="dark" />
          <Text variant="label" tone="ink1">
            Darks
          </Text>
        </Touch>
      </View>
    </View>
  );
}
