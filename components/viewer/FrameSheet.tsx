import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { useLook } from '@/components/ui/useLook';
import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';
import { countTable, fittingLevels, noiseFloor } from './levels';
import { Sheet } from './Sheet';
import { stackLayout } from './sheetLayout';
import { defaultLayers, type MeasuredFrame, type SheetView } from './SheetScene';

export interface FrameSheetProps {
  plane: FramePlane | null;
  misfit: MisfitPlane | null;
  view?: SheetView;
  measured: MeasuredFrame | null;
  wavelengthNm: number | null;
  chosenOrder: number | null;
  onChooseRing?: (order: number | null) => void;
  frameHeightPx?: number;
  chartHeightPx?: number;
  /** 0 leaves the strip out. */
  misfitHeightPx?: number;
}

const nothing = { levels: { low: 0, high: 1 }, floorCounts: 1 };

/** A frame over its profile on one scale, to be looked at and touched; it does not move. */
export function FrameSheet({
  plane,
  misfit,
  view = 'frame',
  measured,
  wavelengthNm,
  chosenOrder,
  onChooseRing,
  frameHeightPx = 296,
  chartHeightPx = 196,
  misfitHeightPx = 48,
}: FrameSheetProps) {
  const { theme } = useLook();
  const [width, setWidth] = useState(0);
  const charted = measured !== null;
  const layout = useMemo(
    () => stackLayout(width, frameHeightPx, charted ? chartHeightPx : 0, charted ? misfitHeightPx : 0),
    [width, frameHeightPx, chartHeightPx, misfitHeightPx, charted],
  );
  const { levels, floorCounts } = useMemo(() => {
    if (!plane) return nothing;
    const table = countTable(plane);
    return {
      levels: fittingLevels(table, plane.blackCount, plane.whiteCount),
      floorCounts: noiseFloor(table, plane.blackCount),
    };
  }, [plane]);
  return (
    <View
      style={{ height: layout.height, alignSelf: 'stretch', overflow: 'hidden' }}
      onLayout={({ nativeEvent }) => setWidth(Math.round(nativeEvent.layout.width))}
    >
      {width > 0 ? (
        <Sheet
          layout={layout}
          plane={plane}
          misfit={misfit}
          measured={measured}
          wavelengthNm={wavelengthNm}
          ownColour
          negative={theme === 'light'}
          view={view}
          tone="log"
          levels={levels}
          floorCounts={floorCounts}
          layers={defaultLayers}
          below="radial"
          segment={null}
          chosenOrder={chosenOrder}
          onChooseRing={onChooseRing}
          movable={false}
          label={
            measured
              ? `The frame with ${measured.rings.filter((r) => r.kind === 'dark').length} dark rings over its profile.`
              : 'The frame.'
          }
        />
      ) : null}
    </View>
  );
}
