import { router, useLocalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { Image, View } from 'react-native';
import { Awaited } from '@/components/ui/Awaited';
import { LoadingLine } from '@/components/ui/LoadingLine';
import { EmptyState } from '@/components/ui/EmptyState';
import { Button } from '@/components/ui/Button';
import { ProblemPlate } from '@/components/ui/ProblemPlate';
import { Screen } from '@/components/ui/Screen';
import { FilmStrip } from '@/components/viewer/FilmStrip';
import { FrameViewer } from '@/components/viewer/FrameViewer';
import { noRings } from '@/components/viewer/noRings';
import type { MeasuredFrame } from '@/components/viewer/SheetScene';
import { saveFile } from '@/hooks/files/saveFile';
import { useBench } from '@/hooks/queries/benches';
import { useCapture } from '@/hooks/queries/captures';
import { useLineProfileCsv } from '@/hooks/queries/lineProfiles';
import { useMeasurement, useRadialProfile } from '@/hooks/queries/measurements';
import { useMisfit, usePlane } from '@/hooks/queries/planes';
import { useThumbnail } from '@/hooks/queries/thumbnails';
import type { CaptureDetail, CaptureFrame } from '@/shared/contracts/captures';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import type { LineSegment } from '@/shared/optics/lineProfile';

/** A frame of a capture, closely: `?measurement=` chooses a run other than the newest. */
export default function FrameScreen() {
  const { captureId, captureFrameId, measurement } = useLocalSearchParams<{
    captureId: string;
    captureFrameId: string;
    measurement?: string;
  }>();
  const capture = useCapture(captureId);
  const whole = capture.data;
  const frame = whole?.frames.find((f) => f.id === captureFrameId);
  if (!whole || !frame) {
    const back = `/captures/${captureId}` as const;
    return (
      <Screen title="Frame" back={back} wavelengthNm={whole?.wavelengthNm}>
        <Awaited result={capture} what="the frame">
          {() => (
            <EmptyState
              sentence="This capture has no such frame."
              action={<Button label="Go to the capture" href={back} />}
            />
          )}
        </Awaited>
      </Screen>
    );
  }
  const measurementId = measurement ?? frame.measurement?.id ?? null;
  return measurementId === null ? (
    <Viewer capture={whole} frame={frame} measurement={null} waiting={false} problem={null} />
  ) : (
    <WithMeasurement capture={whole} frame={frame} measurementId={measurementId} />
  );
}

function WithMeasurement({
  capture,
  frame,
  measurementId,
}: {
  capture: CaptureDetail;
  frame: CaptureFrame;
  measurementId: string;
}) {
  const measurement = useMeasurement(measurementId);
  const own = measurement.data?.captureFrameId === frame.id ? measurement.data : null;
  return (
    <Viewer
      capture={capture}
      frame={frame}
      measurement={own}
      waiting={measurement.isPending}
      problem={measurement.error}
    />
  );
}

interface ViewerData {
  capture: CaptureDetail;
  frame: CaptureFrame;
  measurement: MeasurementDetail | null;
  /** The measurement has not been read yet. */
  waiting: boolean;
  problem: Error | null;
}

function Viewer({ capture, frame, measurement, waiting, problem }: ViewerData) {
  const result = measurement?.result?.status === 'measured' ? measurement.result : null;
  const centrePx = result?.centrePx ?? null;
  const plane = usePlane(frame.state === 'ready' ? frame.frameId : null);
  const profile = useRadialProfile(centrePx ? (measurement?.id ?? null) : null);
  const size = useMemo(
    () =>
      frame.widthPx !== null && frame.heightPx !== null ? { widthPx: frame.widthPx, heightPx: frame.heightPx } : null,
    [frame.widthPx, frame.heightPx],
  );
  const misfit = useMisfit(measurement?.hasMisfit ? measurement.id : null, size);
  const bench = useBench(capture.benchId);
  const revision = bench.data?.revisions.find((r) => r.id === capture.benchRevisionId);
  const pixelPitchUm = measurement?.inputs.pixelPitchUm ?? revision?.camera.pixelPitchUm ?? null;
  const csv = useLineProfileCsv(frame.frameId);
  const measured = useMemo((): MeasuredFrame | null => {
    if (!centrePx || !profile.data || pixelPitchUm === null || !result) return null;
    return { centrePx, rings: result.rings, profile: profile.data, pixelPitchUm };
  }, [centrePx, profile.data, pixelPitchUm, result]);

  const unread = measured ? null : (problem ?? profile.error);
  const awaited = measured !== null || waiting || (centrePx !== null && (profile.isPending || pixelPitchUm === null));

  const same = capture.frames.filter((f) => f.kind === frame.kind);
  const position = { number: same.findIndex((f) => f.id === frame.id) + 1, count: same.length };
  const saveLine = (segment: LineSegment) =>
    csv.mutate(
      { segment, pixelPitchUm },
      {
        onSuccess: (text) =>
          void saveFile(`${capture.apertureSerial}-frame-${position.number}-line.csv`, text, 'text/csv'),
      },
    );
  return (
    <FrameViewer
      capture={capture}
      frame={frame}
      position={position}
      back={measurement ? `/measurements/${measurement.id}` : `/captures/${capture.id}`}
      plane={plane.data ?? null}
      planeNotice={
        plane.error ? (
          <ProblemPlate
            title="Could not read the frame."
            problem={{ message: plane.error.message, id: null }}
            action={{ label: 'Try again', onPress: () => void plane.refetch() }}
          />
        ) : frame.state === 'ready' ? (
          <LoadingLine width={160} awaited="the pixels of the frame" />
        ) : null
      }
      misfit={misfit.data ?? null}
      measured={measured}
      noRings={
        unread
          ? { title: 'Could not read the measurement', message: unread.message }
          : awaited
            ? null
            : noRings(frame, measurement)
      }
      pixelPitchUm={pixelPitchUm}
      film={
        <FilmStrip
          frames={capture.frames}
          chosenId={frame.id}
          onChoose={(id) => router.replace(`/captures/${capture.id}/frames/${id}`)}
          thumbnail={(f) => <Thumbnail frame={f} wavelengthNm={capture.wavelengthNm} />}
        />
      }
      onSaveLine={saveLine}
      saving={csv.isPending}
      saveProblem={csv.error ? csv.error.message : null}
    />
  );
}

function Thumbnail({ frame, wavelengthNm }: { frame: CaptureFrame; wavelengthNm: number }) {
  const picture = useThumbnail(frame.state === 'ready' ? frame.frameId : null, wavelengthNm);
  if (!picture.data) return <View style={{ flex: 1 }} />;
  return (
    <Image source={{ uri: picture.data }} style={{ flex: 1 }} resizeMode="cover" accessibilityIgnoresInvertColors />
  );
}
