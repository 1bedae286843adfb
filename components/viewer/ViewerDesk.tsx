import { useCallback, useMemo, useRef, useState } from 'react';
import { View } from 'react-native';
import { darkRings } from '@/components/charts/ringChoice';
import { DocumentTitle } from '@/components/ui/DocumentTitle';
import { IconButton } from '@/components/ui/IconButton';
import { Panel } from '@/components/ui/Panel';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { ViewSwitch } from '@/components/ui/ViewSwitch';
import { useBenchLight } from '@/hooks/theme/ThemeProvider';
import { maskedCount } from '@/shared/optics/framePlane';
import { DeskRingTable } from './DeskRingTable';
import { frameName, frameNote, viewsFor } from './frameWords';
import { LayersList } from './LayersList';
import { LevelsControl } from './LevelsControl';
import { LinePlates } from './LinePlates';
import { NoRingsPlate } from './NoRingsPlate';
import type { Place } from './place';
import { PointerReadout } from './PointerReadout';
import { createPointerStore } from './pointerStore';
import { ringRows } from './ringRows';
import { RingPlates } from './RingPlates';
import { Sheet, type SheetHandle } from './Sheet';
import { DESK_LOWER_PX, deskLayout } from './sheetLayout';
import { ToneControl } from './ToneControl';
import type { ViewerState } from './useViewerState';
import type { ViewerProps } from './ViewerProps';

const LABEL_PX = 32;
const TAGS_PX = 26;
const noRows: ReadonlyMap<number, number> = new Map();

/** The viewer as a projection sheet: rings become rows to the right and dips below. */
export function ViewerDesk({ props, state }: { props: ViewerProps; state: ViewerState }) {
  const { capture, frame, position, plane, misfit, measured } = props;
  const { colours, widthPx } = useLook();
  useBenchLight(capture.wavelengthNm, capture.benchName);
  const [room, setRoom] = useState({ width: 0, height: 0 });
  const [place, setPlace] = useState<Place | null>(null);
  const [pointer] = useState(createPointerStore);
  const maskedPixels = useMemo(() => (misfit ? maskedCount(misfit) : null), [misfit]);
  const sheet = useRef<SheetHandle>(null);
  const title = `${capture.apertureSerial}, ${frameName(frame, position).toLowerCase()}`;
  // What is still being read keeps its place from the start.
  const coming = measured === null && props.noRings === null;
  const views = viewsFor(false, misfit !== null || coming);
  const view = state.view === 'misfit' && misfit ? 'misfit' : 'frame';
  const charted = measured !== null || coming;
  const lines = state.layers.line || !charted;
  const tableWidth = Math.round(Math.min(462, Math.max(380, room.width * 0.373)));
  const layout = useMemo(
    () => deskLayout(Math.max(300, room.width - tableWidth - 2), Math.max(560, room.height - LABEL_PX), charted),
    [room, tableWidth, charted],
  );
  const layers = useMemo(() => (lines ? { ...state.layers, line: true } : state.layers), [state.layers, lines]);
  const rowsBetween = useMemo(() => ({ top: 28, foot: layout.frame.height - 64 }), [layout]);
  const dark = useMemo(() => (measured ? darkRings(measured.rings) : []), [measured]);
  const rowYs = useMemo(() => {
    if (!measured || !place) return noRows;
    const pxPerMm = place.k / (measured.pixelPitchUm / 1000);
    return ringRows(dark, place.yPx + place.k * measured.centrePx.y, pxPerMm, rowsBetween.top, rowsBetween.foot);
  }, [measured, place, dark, rowsBetween]);
  const onHover = useCallback((point: { x: number; y: number } | null) => pointer.set(point), [pointer]);
  const plateStyle = {
    backgroundColor: colours.plate,
    borderRadius: radius.plate,
    paddingHorizontal: 16,
    paddingVertical: 10,
  };
  const rightX = layout.width + 2;
  const lowerX = (layout.unwrapped ? layout.unwrapped.left : layout.width) + (layout.unwrapped ? 0 : 2);

  return (
    <View style={{ flex: 1, flexDirection: 'row', gap: space.hair, paddingLeft: space.hair, minHeight: 0 }}>
      <DocumentTitle title={title} />
      {props.film}
      <Panel
        title={title}
        note={widthPx < 1340 ? undefined : frameNote(frame, measured ? (frame.measurement?.darkCount ?? null) : null)}
        back={props.back}
        level={1}
        scroll={false}
        main
        action={
          <>
            <IconButton icon="minus" label="Smaller" onPress={() => sheet.current?.zoom(0.8)} />
            <IconButton icon="plus" label="Larger" onPress={() => sheet.current?.zoom(1.25)} />
            <IconButton icon="frame" label="Whole frame" onPress={() => sheet.current?.whole()} />
            <IconButton icon="centre" label="Fit to the profile" onPress={() => sheet.current?.fit()} />
            {views.length > 1 ? (
              <ViewSwitch label="View" views={views} value={view} onChange={state.setView} style={{ width: 230 }} />
            ) : null}
          </>
        }
      >
        <View
          style={{ flex: 1, minHeight: 560 + LABEL_PX, overflow: 'hidden' }}
          onLayout={({ nativeEvent: { layout: box } }) =>
            setRoom({ width: Math.floor(box.width), height: Math.floor(box.height) })
          }
        >
          {room.width > 0 ? (
            <>
              <View
                style={{
                  height: LABEL_PX - 2,
                  width: layout.frame.width,
                  backgroundColor: colours.plate,
                  borderRadius: radius.plate,
                  paddingHorizontal: 16,
                  justifyContent: 'center',
                }}
              >
                <Text variant="label" lines={1}>
                  {planeWords()}
                </Text>
              </View>
              {layout.unwrapped ? (
                <View
                  style={{
                    position: 'absolute',
                    left: layout.unwrapped.left,
                    top: 0,
                    width: layout.width - layout.unwrapped.left,
                    height: LABEL_PX - 2,
                    backgroundColor: colours.plate,
                    borderRadius: radius.plate,
                    paddingHorizontal: 12,
                    justifyContent: 'center',
                  }}
                >
                  <Text variant="label" lines={1}>
                    Angle 0° to 360°
                  </Text>
                </View>
              ) : null}
              <View style={{ position: 'absolute', left: 0, top: LABEL_PX }}>
                <Sheet
                  handle={sheet}
                  layout={layout}
                  plane={plane}
                  misfit={misfit}
                  measured={measured}
                  wavelengthNm={capture.wavelengthNm}
                  ownColour={state.ownColour}
                  negative={state.negative}
                  view={view}
                  tone={state.tone}
                  levels={state.levels}
                  floorCounts={state.floorCounts}
                  layers={layers}
                  below={lines ? 'line' : 'radial'}
                  segment={state.segment}
                  onSegment={state.setSegment}
                  chosenOrder={state.chosenOrder}
                  onChooseRing={state.setChosenOrder}
                  onHover={onHover}
                  onPlace={setPlace}
                  rowsBetween={rowsBetween}
                  label={`${frameName(frame, position)} of ${capture.apertureSerial}.`}
                />
                {plane ? null : (
                  <View style={{ position: 'absolute', left: 0, top: 0, width: layout.frame.width, padding: 24 }}>
                    {props.planeNotice}
                  </View>
                )}
              </View>
              {layout.unwrapped ? (
                <View
                  style={{
                    position: 'absolute',
                    left: layout.unwrapped.left,
                    top: LABEL_PX + layout.unwrapped.height + 2,
                    width: layout.unwrapped.width,
                    height: layout.frame.height - layout.unwrapped.height - 2,
                    backgroundColor: colours.plate,
                    borderRadius: radius.plate,
                    paddingHorizontal: 12,
                    justifyContent: 'center',
                  }}
                >
                  <Text variant="label">Unwrapped: straight lines mean a round hole and a true centre.</Text>
                </View>
              ) : null}
              <View
                style={{ position: 'absolute', left: rightX, top: 0, right: 0, height: LABEL_PX + layout.frame.height }}
              >
                {measured ? (
                  <DeskRingTable
                    dark={dark}
                    measured={measured}
                    rowYs={rowYs}
                    headPx={LABEL_PX}
                    chosenOrder={state.chosenOrder}
                    onChoose={state.setChosenOrder}
                  />
                ) : (
                  <View style={{ flex: 1, backgroundColor: colours.plate, borderRadius: radius.plate }}>
                    {props.noRings ? <NoRingsPlate noRings={props.noRings} /> : null}
                  </View>
                )}
              </View>
              <View
                style={{
                  position: 'absolute',
                  left: lowerX,
                  right: 0,
                  top: LABEL_PX + layout.frame.height + TAGS_PX,
                  height: DESK_LOWER_PX - TAGS_PX,
                  gap: space.hair,
                }}
              >
                {lines ? (
                  <LinePlates
                    segment={state.segment}
                    onSegment={state.setSegment}
                    pixelPitchUm={props.pixelPitchUm}
                    onSave={() => state.segment && props.onSaveLine(state.segment)}
                    saving={props.saving}
                    problem={props.saveProblem}
                  />
                ) : measured ? (
                  <RingPlates
                    ring={dark.find((r) => r.order === state.chosenOrder) ?? null}
                    ringCount={dark.length}
                    pixelPitchUm={measured.pixelPitchUm}
                  />
                ) : (
                  <View style={[plateStyle, { height: 84 }]} />
                )}
                <View style={{ flex: 1, flexDirection: 'row', gap: space.hair, minHeight: 0 }}>
                  {charted || misfit ? (
                    <View style={[plateStyle, { flex: 0.86, minWidth: 0 }]}>
                      <Text variant="section" level={2} style={{ marginBottom: 4 }}>
                        Layers
                      </Text>
                      <LayersList state={state} measured={measured !== null} maskedPixels={maskedPixels} />
                    </View>
                  ) : null}
                  <View style={[plateStyle, { flex: 1.14, minWidth: 0 }]}>
                    <Text variant="section" level={2} style={{ marginBottom: 2 }}>
                      Levels
                    </Text>
                    <LevelsControl
                      table={state.table}
                      whole={state.whole}
                      levels={state.levels}
                      floorCounts={state.floorCounts}
                      onChange={state.setLevels}
                      heightPx={room.width < 1150 ? 56 : 84}
                    />
                    <View style={{ marginTop: 'auto' }}>
                      <ToneControl state={state} />
                    </View>
                  </View>
                  <View style={[plateStyle, { flex: 1, minWidth: 0 }]}>
                    <Text variant="section" level={2} style={{ marginBottom: 4 }}>
                      Under the pointer
                    </Text>
                    <PointerReadout pointer={pointer} plane={plane} misfit={misfit} measured={measured} />
                  </View>
                </View>
              </View>
            </>
          ) : null}
        </View>
      </Panel>
    </View>
  );

  function planeWords(): string {
    const size =
      frame.widthPx !== null && frame.heightPx !== null ? `${frame.widthPx} × ${frame.heightPx} pixels, ` : '';
    const tone =
      view === 'misfit' ? 'misfit in units of the noise' : `${state.tone === 'linear' ? 'linear' : state.tone} tone`;
    const colour = view === 'misfit' ? 'accent above the model, ink below' : state.ownColour ? 'own colour' : 'neutral';
    return `${size}${tone}, ${colour}`;
  }
}
