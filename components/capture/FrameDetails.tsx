import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { CaptureFrame, FrameKind } from '@/shared/contracts/captures';
import { formatBytes, formatDateTime, formatPercent } from '@/shared/units/format';
import { KindSwitch } from './KindSwitch';

export interface FrameActions {
  /** Whether the person may change frames. */
  canChange: boolean;
  busy: boolean;
  onLeaveOut: (leftOut: boolean) => void;
  onKind: (kind: FrameKind) => void;
}

/** What is known of a frame's file, and what can be done with it. */
export function FrameDetails({ frame, canChange, busy, onLeaveOut, onKind }: FrameActions & { frame: CaptureFrame }) {
  const facts = [
    frame.name,
    formatBytes(frame.byteSize),
    frame.format,
    frame.widthPx && frame.heightPx ? `${frame.widthPx} × ${frame.heightPx} px` : null,
    frame.bitDepth ? `${frame.bitDepth} bits` : null,
    frame.health ? `peak ${formatPercent(frame.health.peakFraction, { places: 0 })} of full scale` : null,
    frame.health ? `clipped ${formatPercent(frame.health.clippedFraction)}` : null,
    `stored ${formatDateTime(frame.createdAt)}`,
  ].filter((fact) => fact !== null);
  return (
    <View style={{ gap: space.s }}>
      <Text variant="small" tone="ink2">
        {facts.join(', ')}
      </Text>
      {canChange ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s, alignItems: 'center' }}>
          <KindSwitch value={frame.kind} onChange={onKind} />
          <Button
            dense
            label={frame.leftOut ? 'Put back' : 'Leave out'}
            busy={busy}
            onPress={() => onLeaveOut(!frame.leftOut)}
          />
        </View>
      ) : null}
    </View>
  );
}
