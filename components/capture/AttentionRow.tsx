import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import type { CaptureFrame } from '@/shared/contracts/captures';
import { formatMeasured } from '@/shared/units/format';
import type { Attention } from './captureRows';
import { FrameThumbnail } from './FrameThumbnail';

export interface AttentionRowProps {
  captureId: string;
  frame: CaptureFrame;
  attention: Attention;
  thumbnail: string | null;
  canChange: boolean;
  busy: boolean;
  onLeaveOut: () => void;
  onTakeAgain: () => void;
}

/** A frame that needs a person: what is so, what to do, and the two ways on. */
export function AttentionRow({
  captureId,
  frame,
  attention,
  thumbnail,
  canChange,
  busy,
  onLeaveOut,
  onTakeAgain,
}: AttentionRowProps) {
  const { colours, desk } = useLook();
  const { measurement } = frame;
  const width = desk ? 64 : 56;
  const actions = canChange ? (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      <Button dense label="Leave out" busy={busy} onPress={onLeaveOut} style={{ backgroundColor: colours.gap }} />
      <Button dense label="Take again" onPress={onTakeAgain} style={{ backgroundColor: colours.gap }} />
    </View>
  ) : null;
  const href = measurement
    ? (`/measurements/${measurement.id}` as const)
    : (`/captures/${captureId}/frames/${frame.id}` as const);
  return (
    <View
      role="listitem"
      style={{
        backgroundColor: colours.lift,
        borderRadius: radius.plate,
        flexDirection: 'row',
        alignItems: 'stretch',
        minHeight: desk ? 60 : 70,
        overflow: 'hidden',
      }}
    >
      <FrameThumbnail address={thumbnail} kind={frame.kind} widthPx={width} heightPx="fill" />
      <View
        style={{
          flex: 1,
          minWidth: 0,
          flexDirection: desk ? 'row' : 'column',
          alignItems: desk ? 'center' : 'stretch',
          gap: space.s,
          paddingLeft: 12,
          paddingRight: 8,
          paddingVertical: 8,
        }}
      >
        <Touch
          href={href}
          disabled={!measurement && frame.state !== 'ready'}
          style={{ flex: desk ? 1 : undefined, minWidth: 0, minHeight: 40, justifyContent: 'center' }}
        >
          <Text variant="strong" lines={2}>
            {attention.title}
          </Text>
          <Text variant="small" lines={3}>
            {attention.detail}
          </Text>
          {measurement?.state === 'measured' ? (
            <Text variant="small" tone="ink2">
              {`Measured all the same: ${formatMeasured(measurement.sizeUm, measurement.expandedUncertaintyUm).value} µm.`}
            </Text>
          ) : null}
        </Touch>
        {actions}
      </View>
    </View>
  );
}
