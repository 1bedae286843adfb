import { useState } from 'react';
import { View } from 'react-native';
import { IconButton } from '@/components/ui/IconButton';
import { StageChip } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import { stateWord } from '@/components/measurement/words/stageWords';
import type { CaptureFrame } from '@/shared/contracts/captures';
import { formatMeasured, formatQuantity } from '@/shared/units/format';
import { frameColumns } from './frameColumns';
import { FrameDetails, type FrameActions } from './FrameDetails';
import { FrameThumbnail } from './FrameThumbnail';
import { PeakSlot } from './PeakSlot';
import { shortName } from './shortName';

export interface FrameRowProps extends FrameActions {
  captureId: string;
  frame: CaptureFrame;
  thumbnail: string | null;
}

/** Where a frame stands, for the right end of its row. */
function Outcome({ frame }: { frame: CaptureFrame }) {
  const { desk } = useLook();
  const { measurement } = frame;
  if (frame.leftOut) {
    return (
      <Text variant="small" tone="ink2">
        left out
      </Text>
    );
  }
  if (frame.state === 'unusable') return <StageChip stage="failed" words="cannot be used" />;
  if (frame.state === 'stored') return <StageChip stage="waiting" words="stored, being looked at" />;
  if (frame.kind !== 'light') {
    return (
      <Text variant="small" tone="ink2">
        {frame.kind}
      </Text>
    );
  }
  if (measurement?.state === 'measured') {
    return (
      <Text variant="medium" style={{ fontSize: desk ? 21 : 20, lineHeight: 24 }}>
        {formatMeasured(measurement.sizeUm, measurement.expandedUncertaintyUm).value}
      </Text>
    );
  }
  if (!measurement) return <StageChip stage="waiting" words="not measured" />;
  return <StageChip stage={measurement.state} words={stateWord(measurement.state, measurement.stage)} />;
}

/** One frame of a capture: picture, name, peak in its gap, noise, and its size or where it stands. */
export function FrameRow({ captureId, frame, thumbnail, ...actions }: FrameRowProps) {
  const { colours, desk } = useLook();
  const [open, setOpen] = useState(false);
  const { measurement, health } = frame;
  const viewer = `/captures/${captureId}/frames/${frame.id}` as const;
  const hasAnswer = measurement?.state === 'measured' || measurement?.state === 'refused';
  const width = desk ? 64 : 56;
  const height = 54;
  return (
    <View role="listitem" style={{ backgroundColor: colours.plate, borderRadius: radius.plate, overflow: 'hidden' }}>
      <View
        style={{ flexDirection: 'row', alignItems: 'center', minHeight: height, opacity: frame.leftOut ? 0.75 : 1 }}
      >
        <Touch
          href={viewer}
          label={`Look at ${frame.name}`}
          style={{ width, height }}
          disabled={frame.state !== 'ready'}
        >
          <FrameThumbnail address={thumbnail} kind={frame.kind} widthPx={width} heightPx={height} />
        </Touch>
        <Touch
          href={hasAnswer && measurement ? `/measurements/${measurement.id}` : viewer}
          disabled={frame.state !== 'ready'}
          style={({ pressed }) => ({
            flex: 1,
            minWidth: 0,
            height,
            flexDirection: 'row',
            alignItems: 'center',
            gap: frameColumns.gap,
            paddingLeft: frameColumns.gap,
            backgroundColor: pressed ? colours.lift : undefined,
          })}
        >
          {desk ? (
            <>
              <Text tone="ink0" lines={1} style={{ flex: 1, minWidth: 0 }}>
                {shortName(frame.name, 21)}
              </Text>
              <Text align="right" style={{ width: frameColumns.exposure }}>
                {frame.exposureMs === null ? '–' : formatQuantity(frame.exposureMs, 'ms', { significant: 2 })}
              </Text>
              <View style={{ width: frameColumns.peak }}>
                {health && frame.kind === 'light' ? <PeakSlot health={health} /> : null}
              </View>
              <Text align="right" style={{ width: frameColumns.noise }}>
                {health ? health.noiseCounts.toFixed(2) : '–'}
              </Text>
            </>
          ) : (
            <View style={{ flex: 1, minWidth: 0, gap: 4 }}>
              <Text variant="small" tone="ink0" lines={1}>
                {shortName(frame.name, 30)}
              </Text>
              {health && frame.kind === 'light' ? <PeakSlot health={health} style={{ width: 104 }} /> : null}
            </View>
          )}
          <View
            style={{
              width: desk ? frameColumns.outcome : undefined,
              alignItems: 'flex-end',
              flexShrink: 0,
              maxWidth: desk ? undefined : 190,
            }}
          >
            <Outcome frame={frame} />
          </View>
        </Touch>
        <IconButton
          icon="more"
          label={open ? `Close what can be done with ${frame.name}` : `What can be done with ${frame.name}`}
          on={open}
          onPress={() => setOpen(!open)}
        />
      </View>
      {open ? (
        <View style={{ paddingLeft: desk ? width + space.m : space.l, paddingRight: space.l, paddingBottom: space.m }}>
          <FrameDetails frame={frame} {...actions} />
        </View>
      ) : null}
    </View>
  );
}
