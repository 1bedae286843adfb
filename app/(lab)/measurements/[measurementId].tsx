import { useLocalSearchParams, router } from 'expo-router';
import { useState } from 'react';
import { Image, View } from 'react-native';
import { LotPieces } from '@/components/capture/LotPieces';
import { AgainForm } from '@/components/measurement/AgainForm';
import { asEntered } from '@/components/measurement/asEntered';
import { Belief } from '@/components/measurement/Belief';
import { HistoryList } from '@/components/measurement/HistoryList';
import { OlderRun } from '@/components/measurement/OlderRun';
import { RefusedAnswer } from '@/components/measurement/RefusedAnswer';
import { RingTable } from '@/components/measurement/RingTable';
import { RunningAnswer } from '@/components/measurement/RunningAnswer';
import { SizePlate } from '@/components/measurement/SizePlate';
import { UsedForThis } from '@/components/measurement/UsedForThis';
import { refusalName } from '@/components/measurement/words/refusalWords';
import { Awaited } from '@/components/ui/Awaited';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { Button } from '@/components/ui/Button';
import { IconButton } from '@/components/ui/IconButton';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Plate } from '@/components/ui/Plate';
import { Screen } from '@/components/ui/Screen';
import { StageChip } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { ViewSwitch } from '@/components/ui/ViewSwitch';
import { FrameSheet } from '@/components/viewer/FrameSheet';
import { saveFile } from '@/hooks/files/saveFile';
import { csvFileName, type CsvPart } from '@/shared/units/csvFileName';
import { useFrameEvidence } from '@/hooks/queries/frameEvidence';
import { useLot } from '@/hooks/queries/lots';
import { useMeasureAgain, useMeasurement, useMeasurementCsv } from '@/hooks/queries/measurements';
import { useThumbnail } from '@/hooks/queries/thumbnails';
import { useRole } from '@/hooks/session/SessionProvider';
import type { Measured } from '@/shared/contracts/measureResult';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { BENCH } from '@/shared/contracts/roles';
import { formatNumber } from '@/shared/units/format';

/** One run of the engine over one frame: the size first, then why it can be believed. */
export default function MeasurementScreen() {
  const { measurementId } = useLocalSearchParams<{ measurementId: string }>();
  const measurement = useMeasurement(measurementId);
  return (
    <AwaitedScreen result={measurement} what="the measurement" title="Measurement" back="/">
      {(data) => <MeasurementOf key={measurementId} measurement={data} />}
    </AwaitedScreen>
  );
}

function MeasurementOf({ measurement }: { measurement: MeasurementDetail }) {
  const { desk, layout } = useLook();
  const [again, setAgain] = useState(false);
  const [chosenOrder, chooseRing] = useState<number | null>(null);
  const canMeasure = BENCH.includes(useRole());
  const viewer =
    `/captures/${measurement.captureId}/frames/${measurement.captureFrameId}?measurement=${measurement.id}` as const;
  const measured = measurement.result?.status === 'measured' ? measurement.result : null;
  const stopped = measurement.state === 'refused' || measurement.state === 'failed';
  const running = measurement.state === 'waiting' || measurement.state === 'measuring';
  const wide = layout !== 'phone';
  const tablet = wide && !desk;
  const nominal = `${asEntered(measurement.nominalSizeUm)} µm`;

  const evidence =
    wide && !running ? (
      <Evidence measurement={measurement} measured={measured} chosenOrder={chosenOrder} onChooseRing={chooseRing} />
    ) : null;
  const answer = (
    <>
      {stopped ? (
        <RefusedAnswer
          state={measurement.state === 'refused' ? 'refused' : 'failed'}
          reason={measurement.reason}
          message={measurement.message}
        />
      ) : null}
      {measured ? (
        <Belief
          measurement={measurement}
          measured={measured}
          ringTable={
            wide ? null : (
              <RingTable
                rings={measured.rings}
                expandedUncertaintyUm={measured.expandedUncertaintyUm}
                chosenOrder={chosenOrder}
                onChooseRing={chooseRing}
              />
            )
          }
        />
      ) : null}
      {running ? null : <UsedForThis measurement={measurement} />}
      {measured ? <Exports measurement={measurement} /> : null}
      <HistoryList measurement={measurement} />
    </>
  );

  const foot = again ? (
    <Again measurement={measurement} onClose={() => setAgain(false)} />
  ) : (
    <View style={{ flexDirection: 'row', gap: space.hair, paddingTop: desk ? 0 : space.hair }}>
      {canMeasure && !running ? (
        <Button
          label="Again"
          icon="retry"
          fullBleed={!desk}
          onPress={() => setAgain(true)}
          style={{ minHeight: 68, width: 126 }}
        />
      ) : null}
      {stopped && canMeasure ? (
        <Button
          label="Take again"
          kind="primary"
          icon="snap"
          trailing={null}
          fullBleed={!desk}
          href={`/captures/${measurement.captureId}`}
          style={{ flex: 1, minHeight: 68 }}
        />
      ) : (
        <Button
          label={running ? 'Go to the capture' : 'Look at the frame'}
          kind="primary"
          fullBleed={!desk}
          href={running ? `/captures/${measurement.captureId}` : viewer}
          style={{ flex: 1, minHeight: 68 }}
        />
      )}
    </View>
  );

  return (
    <Screen
      title={measurement.apertureSerial}
      subtitle={desk ? nominal : `${nominal}, lot ${measurement.lotNumber}`}
      back={desk ? undefined : `/captures/${measurement.captureId}`}
      action={
        desk ? (
          <StageChip stage={measurement.state} />
        ) : (
          <IconButton icon="frame" label="Look at the frame" href={viewer} />
        )
      }
      foot={foot}
      wavelengthNm={measurement.wavelengthNm}
      benchLabel={measurement.benchName}
      list={
        desk
          ? {
              title: measurement.lotNumber,
              back: `/lots/${measurement.lotId}`,
              width: 252,
              content: <Pieces measurement={measurement} />,
            }
          : undefined
      }
      evidence={
        desk && evidence
          ? { title: stopped ? 'The frame' : 'Why to believe it', width: 452, content: evidence }
          : undefined
      }
    >
      {measurement.newest ? null : <OlderRun measurement={measurement} />}
      {running ? (
        <RunningAnswer state={measurement.state === 'waiting' ? 'waiting' : 'measuring'} stage={measurement.stage} />
      ) : null}
      {stopped && !wide ? <FramePicture measurement={measurement} /> : null}
      {measured ? <SizePlate measurement={measurement} measured={measured} /> : null}
      {tablet && evidence ? (
        <View style={{ flexDirection: 'row', gap: space.hair, alignItems: 'flex-start' }}>
          <View style={{ flex: 1, minWidth: 0, gap: space.hair }}>{answer}</View>
          <View style={{ width: 400, gap: space.hair }}>{evidence}</View>
        </View>
      ) : (
        answer
      )}
    </Screen>
  );
}

interface EvidenceProps {
  measurement: MeasurementDetail;
  measured: Measured | null;
  chosenOrder: number | null;
  onChooseRing: (order: number | null) => void;
}

function Evidence({ measurement, measured, chosenOrder, onChooseRing }: EvidenceProps) {
  const [view, setView] = useState<'frame' | 'misfit'>('frame');
  // Frames that do not fit together can each be looked at all the same.
  const unseen = measurement.state === 'failed' && measurement.reason !== 'bad-case';
  const evidence = useFrameEvidence(unseen ? null : measurement.frameId, measurement);
  if (unseen) {
    return (
      <Plate>
        <Text tone="ink2">There is no picture of this frame: it could not be read.</Text>
      </Plate>
    );
  }
  const fit = measured?.reducedChiSquare;
  return (
    <>
      {measurement.hasMisfit ? (
        <ViewSwitch
          label="What is shown"
          views={[
            { value: 'frame', label: 'Frame' },
            { value: 'misfit', label: 'Misfit' },
          ]}
          value={view}
          onChange={setView}
        />
      ) : null}
      <Plate padding="none">
        <FrameSheet
          plane={evidence.plane}
          misfit={evidence.misfit}
          view={view}
          measured={evidence.measured}
          wavelengthNm={measurement.wavelengthNm}
          chosenOrder={chosenOrder}
          onChooseRing={onChooseRing}
          frameHeightPx={286}
          chartHeightPx={176}
        />
        {evidence.error ? (
          <Text variant="small" tone="ink2" style={{ padding: 16 }}>
            {`The frame could not be read. ${evidence.error.message}`}
          </Text>
        ) : null}
      </Plate>
      {measured ? (
        <RingTable
          rings={measured.rings}
          expandedUncertaintyUm={measured.expandedUncertaintyUm}
          chosenOrder={chosenOrder}
          onChooseRing={onChooseRing}
          foot={typeof fit !== 'number' ? undefined : `Fit ${formatNumber(fit, { places: 2 })}, expected 1.00.`}
        />
      ) : null}
    </>
  );
}

/** On a phone the frame of a refusal stands above the reason, as a picture; the viewer opens from the head. */
function FramePicture({ measurement }: { measurement: MeasurementDetail }) {
  const { colours } = useLook();
  const picture = useThumbnail(measurement.state === 'failed' ? null : measurement.frameId, measurement.wavelengthNm);
  if (measurement.state === 'failed') return null;
  return (
    <View style={{ height: 262, backgroundColor: colours.well }}>
      {picture.data ? (
        <Image
          source={{ uri: picture.data }}
          alt={`The frame ${measurement.frameName}`}
          resizeMode="cover"
          style={{ width: '100%', height: 262 }}
        />
      ) : null}
    </View>
  );
}

function Exports({ measurement }: { measurement: MeasurementDetail }) {
  const { warn, say } = useNotice();
  const csv = useMeasurementCsv(measurement.id);
  const save = (table: 'radialProfileCsv' | 'ringTableCsv', what: CsvPart) =>
    csv.mutate(table, {
      onSuccess: (text) => {
        const name = csvFileName(measurement, what);
        saveFile(name, text, 'text/csv')
          .then(() => say(`${name} is saved.`))
          .catch(() => warn(`${name} could not be saved on this device.`));
      },
      onError: (error) => warn(error.message),
    });
  return (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      <Button
        label="Radial profile, CSV"
        icon="get"
        busy={csv.isPending && csv.variables === 'radialProfileCsv'}
        onPress={() => save('radialProfileCsv', 'radial-profile')}
        style={{ flex: 1 }}
      />
      <Button
        label="Ring table, CSV"
        icon="get"
        busy={csv.isPending && csv.variables === 'ringTableCsv'}
        onPress={() => save('ringTableCsv', 'rings')}
        style={{ flex: 1 }}
      />
    </View>
  );
}

function Again({ measurement, onClose }: { measurement: MeasurementDetail; onClose: () => void }) {
  const measureAgain = useMeasureAgain(measurement.id);
  return (
    <AgainForm
      settings={measurement.settings}
      busy={measureAgain.isPending}
      problem={measureAgain.error?.message ?? null}
      onClose={onClose}
      onMeasure={(settings) =>
        measureAgain.mutate(settings, { onSuccess: (next) => router.push(`/measurements/${next.id}`) })
      }
    />
  );
}

function Pieces({ measurement }: { measurement: MeasurementDetail }) {
  const lot = useLot(measurement.lotId);
  return (
    <Awaited result={lot} what="the lot">
      {({ apertures }) => (
        <LotPieces
          apertures={apertures}
          chosenId={measurement.apertureId}
          chosenWord={measurement.state === 'measured' ? undefined : refusalWord(measurement)}
          beginHref={(aperture) => `/capture?aperture=${aperture.id}`}
        />
      )}
    </Awaited>
  );
}

const refusalWord = ({ state, reason }: MeasurementDetail) =>
  state === 'refused' || state === 'failed' ? refusalName(reason).toLowerCase() : 'now';
