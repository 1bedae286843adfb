import { useLocalSearchParams } from 'expo-router';
import { useCallback, useMemo, useState } from 'react';
import { View } from 'react-native';
import { AttentionRow } from '@/components/capture/AttentionRow';
import { BatchBar } from '@/components/capture/BatchBar';
import { CaptureCautions } from '@/components/capture/CaptureCautions';
import { CaptureFoot, type FrameOrigin } from '@/components/capture/CaptureFoot';
import {
  attentionOf,
  calibrationRows,
  captureRows,
  lightRows,
  type CaptureRow,
} from '@/components/capture/captureRows';
import { ColumnHeads } from '@/components/capture/ColumnHeads';
import { DarksHead } from '@/components/capture/DarksHead';
import { DropZone } from '@/components/capture/DropZone';
import { EarlierBatch } from '@/components/capture/EarlierBatch';
import { FrameRow } from '@/components/capture/FrameRow';
import { LotPieces } from '@/components/capture/LotPieces';
import { MeanSoFar } from '@/components/capture/MeanSoFar';
import { MeasureLine } from '@/components/capture/MeasureLine';
import { newestMeasured } from '@/components/capture/newestMeasured';
import { SendingRow } from '@/components/capture/SendingRow';
import { shortName } from '@/components/capture/shortName';
import { SizesAsTheyArrive } from '@/components/capture/SizesAsTheyArrive';
import { asEntered } from '@/components/measurement/asEntered';
import { Awaited } from '@/components/ui/Awaited';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Plate } from '@/components/ui/Plate';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { FrameSheet } from '@/components/viewer/FrameSheet';
import { useCapture, useMeasureCapture, useUpdatePlace } from '@/hooks/queries/captures';
import { useFrameEvidence } from '@/hooks/queries/frameEvidence';
import { useLot } from '@/hooks/queries/lots';
import { useMeasurement } from '@/hooks/queries/measurements';
import { useThumbnails } from '@/hooks/queries/thumbnails';
import { useRole } from '@/hooks/session/SessionProvider';
import { pickFromLibrary, pickStills, snapFrame } from '@/hooks/upload/pickFrames';
import { useDrop } from '@/hooks/upload/useDrop';
import { useUploads } from '@/hooks/upload/useUploads';
import type { CaptureDetail, CaptureFrame, FrameKind } from '@/shared/contracts/captures';
import { BENCH } from '@/shared/contracts/roles';
import { formatTime } from '@/shared/units/format';

const pickFrom = { camera: snapFrame, library: pickFromLibrary, files: pickStills };

/** The frames of one aperture, taken in one go: sent, looked at and measured while one watches. */
export default function CaptureScreen() {
  const { captureId } = useLocalSearchParams<{ captureId: string }>();
  const capture = useCapture(captureId);
  return (
    <AwaitedScreen result={capture} what="the capture" title="Capture" back="/capture">
      {(data) => <Capture key={captureId} capture={data} />}
    </AwaitedScreen>
  );
}

function Capture({ capture }: { capture: CaptureDetail }) {
  const { desk } = useLook();
  const { warn } = useNotice();
  const canChange = BENCH.includes(useRole());
  const uploads = useUploads(capture.id);
  const measure = useMeasureCapture(capture.id);
  const rows = useMemo(() => captureRows(capture.frames, uploads.items), [capture.frames, uploads.items]);
  // A dark has nothing to show: stretched to the eye it would only glare.
  const pictured = capture.frames.filter((frame) => frame.state === 'ready' && frame.kind !== 'dark');
  const ready = pictured.map((frame) => frame.frameId);
  const outdated = capture.frames.filter(
    ({ kind, state, leftOut, measurement }) =>
      kind === 'light' &&
      state === 'ready' &&
      !leftOut &&
      measurement?.finishedAt &&
      measurement.darkCount < capture.darkCount,
  ).length;
  const thumbnails = useThumbnails(ready, capture.wavelengthNm);
  const lights = lightRows(rows);
  const calibration = calibrationRows(rows);
  const drop = useDrop((sources) => canChange && uploads.add(sources));

  const { add } = uploads;
  const take = useCallback(
    async (origin: FrameOrigin, kind: FrameKind | null) => {
      const { sources, problem } = await pickFrom[origin]();
      if (problem) warn(problem);
      if (sources.length > 0) add(sources, kind ?? undefined);
    },
    [add, warn],
  );
  const takeFrom = (origin: FrameOrigin, kind: FrameKind | null) =>
    void take(origin, kind).catch((cause: unknown) =>
      warn(cause instanceof Error ? `No frame could be chosen: ${cause.message}` : 'No frame could be chosen.'),
    );

  const unmeasured = capture.frames.filter(
    (frame) => frame.kind === 'light' && frame.state === 'ready' && !frame.leftOut && frame.measurement === null,
  ).length;
  const moving = uploads.workingCount > 0;
  const row = (entry: CaptureRow) => (
    <CaptureEntry
      key={entry.key}
      entry={entry}
      captureId={capture.id}
      thumbnail={entry.type === 'frame' ? (thumbnails[entry.frame.frameId] ?? null) : null}
      canChange={canChange}
      uploads={uploads}
      onTakeAgain={() => takeFrom(desk ? 'files' : 'camera', null)}
    />
  );
  const buttons = (
    <View style={{ width: 212, gap: space.hair }}>
      <Button label="Add stills" kind="primary" icon="stills" trailing={null} onPress={() => takeFrom('files', null)} />
      <View style={{ flexDirection: 'row', gap: space.hair }}>
        <Button dense label="Darks" icon="dark" onPress={() => takeFrom('files', 'dark')} style={{ flex: 1 }} />
        <Button dense label="Flats" icon="levels" onPress={() => takeFrom('files', 'flat')} style={{ flex: 1 }} />
      </View>
    </View>
  );

  return (
    <Screen
      title={capture.apertureSerial}
      subtitle={`${asEntered(capture.nominalSizeUm)} µm, lot ${capture.lotNumber}`}
      back={`/lots/${capture.lotId}`}
      wavelengthNm={capture.wavelengthNm}
      benchLabel={capture.benchName}
      foot={!desk && canChange ? <CaptureFoot onTake={takeFrom} /> : undefined}
      list={desk ? { title: capture.lotNumber, width: 236, content: <Pieces capture={capture} /> } : undefined}
      evidence={desk ? newestSide(capture) : undefined}
    >
      <Plate>
        <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: 22 }}>
          <MeanSoFar serial={capture.apertureSerial} mean={capture.mean} lights={lights} />
          {desk && canChange ? buttons : null}
        </View>
      </Plate>
      {canChange ? (
        <EarlierBatch
          names={uploads.earlier.map((file) => file.name)}
          onChoose={() => takeFrom('files', null)}
          onForget={uploads.forgetEarlier}
        />
      ) : null}
      <BatchBar
        workingCount={uploads.workingCount}
        keptCount={uploads.keptCount}
        onCancelAll={uploads.cancelAll}
        onTryNow={uploads.retryNow}
      />
      {canChange && !moving ? (
        <MeasureLine
          outdatedCount={Math.min(outdated, capture.outdatedCount)}
          unmeasuredCount={unmeasured}
          busy={measure.isPending}
          onMeasure={() => measure.mutate({}, { onError: (error) => warn(error.message) })}
        />
      ) : null}
      {lights.length === 0 ? (
        <EmptyState
          sentence={
            canChange
              ? 'No frames yet. Snap one, or add the stills of the camera. Each is measured as soon as it is stored.'
              : 'No frames yet. A technician takes them.'
          }
        />
      ) : (
        <View>
          <ColumnHeads />
          <View role="list" aria-label="Frames" style={{ gap: space.hair }}>
            {lights.map(row)}
          </View>
        </View>
      )}
      <View>
        <DarksHead count={capture.darkCount} />
        {calibration.length > 0 ? (
          <View role="list" aria-label="Darks and flats" style={{ gap: space.hair }}>
            {calibration.map(row)}
          </View>
        ) : null}
      </View>
      {canChange ? <CaptureCautions /> : null}
      {canChange && drop.canDrop && desk ? <DropZone over={drop.over} /> : null}
    </Screen>
  );
}

function newestSide(capture: CaptureDetail) {
  const frame = newestMeasured(capture.frames);
  return {
    title: frame ? `Newest: ${shortName(frame.name, 20)}` : 'Newest size',
    note: frame?.measurement?.finishedAt ? formatTime(frame.measurement.finishedAt) : undefined,
    width: 420,
    content: frame ? (
      <Newest capture={capture} frame={frame} />
    ) : (
      <Plate>
        <Text tone="ink2">The newest frame with its profile stands here as soon as it is measured.</Text>
      </Plate>
    ),
  };
}

function Newest({ capture, frame }: { capture: CaptureDetail; frame: CaptureFrame }) {
  const measurement = useMeasurement(frame.measurement?.id ?? null);
  const evidence = useFrameEvidence(frame.frameId, measurement.data ?? null);
  const [chosenOrder, chooseRing] = useState<number | null>(null);
  return (
    <>
      <Plate padding="none">
        <FrameSheet
          plane={evidence.plane}
          misfit={evidence.misfit}
          measured={evidence.measured}
          wavelengthNm={capture.wavelengthNm}
          chosenOrder={chosenOrder}
          onChooseRing={chooseRing}
          frameHeightPx={286}
          chartHeightPx={178}
          misfitHeightPx={0}
        />
      </Plate>
      <SizesAsTheyArrive capture={capture} />
    </>
  );
}

function Pieces({ capture }: { capture: CaptureDetail }) {
  const lot = useLot(capture.lotId);
  return (
    <Awaited result={lot} what="the lot">
      {({ apertures }) => (
        <LotPieces
          apertures={apertures}
          chosenId={capture.apertureId}
          chosenWord="now"
          beginHref={(aperture) => `/capture?aperture=${aperture.id}`}
        />
      )}
    </Awaited>
  );
}

interface CaptureEntryProps {
  entry: CaptureRow;
  captureId: string;
  thumbnail: string | null;
  canChange: boolean;
  uploads: ReturnType<typeof useUploads>;
  onTakeAgain: () => void;
}

function CaptureEntry({ entry, captureId, thumbnail, canChange, uploads, onTakeAgain }: CaptureEntryProps) {
  const { warn } = useNotice();
  const update = useUpdatePlace(captureId);
  if (entry.type === 'sending') {
    const { file } = entry;
    return (
      <SendingRow
        file={file}
        onKind={(kind) => uploads.setKind(file.id, kind)}
        onCancel={() => uploads.cancel(file.id)}
        onRetry={() => uploads.retry(file.id)}
        onDismiss={() => uploads.dismiss(file.id)}
      />
    );
  }
  const { frame } = entry;
  const change = (what: { kind?: FrameKind; leftOut?: boolean }) =>
    update.mutate({ captureFrameId: frame.id, ...what }, { onError: (error) => warn(error.message) });
  const attention = attentionOf(frame);
  return attention ? (
    <AttentionRow
      captureId={captureId}
      frame={frame}
      attention={attention}
      thumbnail={thumbnail}
      canChange={canChange}
      busy={update.isPending}
      onLeaveOut={() => change({ leftOut: true })}
      onTakeAgain={onTakeAgain}
    />
  ) : (
    <FrameRow
      captureId={captureId}
      frame={frame}
      thumbnail={thumbnail}
      canChange={canChange}
      busy={update.isPending}
      onLeaveOut={(leftOut) => change({ leftOut })}
      onKind={(kind) => change({ kind })}
    />
  );
}
