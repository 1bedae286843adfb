import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { darkRings } from '@/components/charts/ringChoice';
import { IconButton } from '@/components/ui/IconButton';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { ViewSwitch } from '@/components/ui/ViewSwitch';
import { maskedCount } from '@/shared/optics/framePlane';
import { formatNumber } from '@/shared/units/format';
import { frameName, frameSubtitle, viewsFor } from './frameWords';
import { LayersList } from './LayersList';
import { LevelsControl } from './LevelsControl';
import { LinePlates } from './LinePlates';
import { NoRingsPlate } from './NoRingsPlate';
import { RingPlates } from './RingPlates';
import { Sheet } from './Sheet';
import { stackLayout } from './sheetLayout';
import { ToneControl } from './ToneControl';
import { ToolFoot } from './ToolFoot';
import type { ViewerState } from './useViewerState';
import type { ViewerProps } from './ViewerProps';

/** The viewer in one column: views, sheet, one panel, tools under the thumb. */
export function ViewerPhone({ props, state }: { props: ViewerProps; state: ViewerState }) {
  const { capture, frame, position, plane, misfit, measured } = props;
  const { colours } = useLook();
  const maskedPixels = useMemo(() => (misfit ? maskedCount(misfit) : null), [misfit]);
  const [room, setRoom] = useState({ width: 0, height: 0 });
  // What is still being read keeps its place from the start.
  const coming = measured === null && props.noRings === null;
  const views = viewsFor(measured !== null || coming, misfit !== null || coming);
  const view = views.some((v) => v.value === state.view) ? state.view : 'frame';
  const lines = state.layers.line;
  const charted = measured !== null || coming || lines;
  const layout = useMemo(() => {
    const tight = room.height < 480;
    const chart = charted ? (tight ? 150 : room.height > 760 ? 240 : 196) : 0;
    const strip = charted ? (tight ? 40 : 48) : 0;
    const frameHeight = Math.max(140, room.height - (charted ? 24 + chart + strip + 2 : 0));
    return stackLayout(room.width, frameHeight, chart, strip);
  }, [room, charted]);
  return (
    <Screen
      title={capture.apertureSerial}
      subtitle={frameSubtitle(frame, position)}
      back={props.back}
      action={
        <IconButton
          icon="layers"
          label="Layers"
          on={state.tool === 'layers'}
          onPress={() => state.setTool(state.tool === 'layers' ? 'rings' : 'layers')}
        />
      }
      foot={<ToolFoot tool={state.tool} onChange={state.setTool} />}
      wavelengthNm={capture.wavelengthNm}
      benchLabel={capture.benchName}
      scroll={false}
    >
      {views.length > 1 ? <ViewSwitch label="View" views={views} value={view} onChange={state.setView} /> : null}
      <View
        style={{ flex: 1, minHeight: 0, marginTop: space.hair, overflow: 'hidden' }}
        onLayout={({ nativeEvent: { layout: box } }) =>
          setRoom({ width: Math.round(box.width), height: Math.floor(box.height) })
        }
      >
        {room.width > 0 ? (
          <Sheet
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
            layers={state.layers}
            below={lines ? 'line' : 'radial'}
            segment={state.segment}
            onSegment={state.setSegment}
            chosenOrder={state.chosenOrder}
            onChooseRing={state.setChosenOrder}
            label={`${frameName(frame, position)} of ${capture.apertureSerial}.`}
          />
        ) : null}
        {plane ? null : (
          <View style={{ position: 'absolute', left: 0, right: 0, top: 0, padding: 16 }}>{props.planeNotice}</View>
        )}
      </View>
      <View style={{ marginTop: space.hair }}>{panel()}</View>
    </Screen>
  );

  function panel() {
    const plate = {
      backgroundColor: colours.plate,
      borderRadius: radius.plate,
      minHeight: 66,
      justifyContent: 'center' as const,
    };
    switch (state.tool) {
      case 'tone':
        return (
          <View style={plate}>
            <ToneControl state={state} />
          </View>
        );
      case 'levels':
        return (
          <View style={[plate, { paddingHorizontal: 20, paddingTop: 8 }]}>
            <LevelsControl
              table={state.table}
              whole={state.whole}
              levels={state.levels}
              floorCounts={state.floorCounts}
              onChange={state.setLevels}
            />
          </View>
        );
      case 'layers':
        return (
          <View style={plate}>
            <LayersList state={state} measured={measured !== null} maskedPixels={maskedPixels} />
          </View>
        );
      case 'line':
        return (
          <LinePlates
            segment={state.segment}
            onSegment={state.setSegment}
            pixelPitchUm={props.pixelPitchUm}
            onSave={() => state.segment && props.onSaveLine(state.segment)}
            saving={props.saving}
            problem={props.saveProblem}
          />
        );
      case 'mask':
        return (
          <View style={[plate, { paddingHorizontal: 16, paddingVertical: 8 }]}>
            <Text variant="small">
              {maskedPixels !== null
                ? `${formatNumber(maskedPixels, { places: 0 })} pixels are left out of the fit: clipped, hot, dead or beyond the fit. They are hatched.`
                : 'This frame has no mask: it was not fitted.'}
            </Text>
          </View>
        );
      case 'rings':
        if (props.noRings) return <NoRingsPlate noRings={props.noRings} />;
        if (!measured) return <View style={plate} />;
        return (
          <RingPlates
            ring={darkRings(measured.rings).find((r) => r.order === state.chosenOrder) ?? null}
            ringCount={darkRings(measured.rings).length}
            pixelPitchUm={measured.pixelPitchUm}
          />
        );
    }
  }
}
