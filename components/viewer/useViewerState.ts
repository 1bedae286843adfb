import { useCallback, useMemo, useState } from 'react';
import type { FramePlane } from '@/shared/optics/framePlane';
import type { LineSegment } from '@/shared/optics/lineProfile';
import { countTable, fittingLevels, noiseFloor, type Levels, type Tone } from './levels';
import { defaultLayers, type MeasuredFrame, type SheetLayers, type SheetView } from './SheetScene';

/** What the panel under the sheet of a phone holds. */
export type Tool = 'tone' | 'levels' | 'rings' | 'line' | 'mask' | 'layers';

/** How the frame is looked at, and how that is changed. */
export interface ViewerState {
  view: SheetView;
  setView: (view: SheetView) => void;
  tool: Tool;
  setTool: (tool: Tool) => void;
  tone: Tone;
  setTone: (tone: Tone) => void;
  ownColour: boolean;
  setOwnColour: (on: boolean) => void;
  negative: boolean;
  setNegative: (on: boolean) => void;
  layers: SheetLayers;
  setLayer: (layer: keyof SheetLayers, on: boolean) => void;
  levels: Levels;
  setLevels: (levels: Levels) => void;
  /** The whole range that levels can take. */
  whole: Levels;
  table: Uint32Array;
  floorCounts: number;
  segment: LineSegment | null;
  setSegment: (segment: LineSegment) => void;
  chosenOrder: number | null;
  setChosenOrder: (order: number | null) => void;
}

const noCounts = new Uint32Array(65536);

/**
 * View state of the viewer. Tone, colours and layers stay from frame to frame; levels, line and the chosen ring belong
 * to the frame.
 */
export function useViewerState(
  frameId: string,
  plane: FramePlane | null,
  measured: MeasuredFrame | null,
  lightTheme: boolean,
): ViewerState {
  const [view, setView] = useState<SheetView>('frame');
  const [tool, setToolState] = useState<Tool>('rings');
  const [tone, setTone] = useState<Tone>('log');
  const [ownColour, setOwnColour] = useState(true);
  const [negativeChoice, setNegative] = useState<boolean | null>(null);
  const [layers, setLayers] = useState<SheetLayers>(defaultLayers);
  const [own, setOwn] = useState<{ frameId: string; levels?: Levels; segment?: LineSegment; order?: number | null }>({
    frameId,
  });
  const mine = own.frameId === frameId ? own : { frameId };

  const counts = useMemo(() => {
    if (!plane)
      return { table: noCounts, whole: { low: 0, high: 65535 }, fitting: { low: 0, high: 1 }, floorCounts: 1 };
    const table = countTable(plane);
    return {
      table,
      whole: { low: Math.min(plane.blackCount, plane.whiteCount - 1), high: plane.whiteCount },
      fitting: fittingLevels(table, plane.blackCount, plane.whiteCount),
      floorCounts: noiseFloor(table, plane.blackCount),
    };
  }, [plane]);
  const firstSegment = useMemo((): LineSegment | null => {
    if (!plane) return null;
    const centre = measured?.centrePx ?? { x: (plane.widthPx - 1) / 2, y: (plane.heightPx - 1) / 2 };
    const y = Math.min(plane.heightPx - 1, Math.max(0, centre.y));
    return {
      x0: Math.min(Math.max(0, centre.x), plane.widthPx * 0.8),
      y0: y,
      x1: plane.widthPx * 0.92,
      y1: y * 0.82,
      widthPx: 5,
    };
  }, [plane, measured]);

  const setLayer = useCallback(
    (layer: keyof SheetLayers, on: boolean) => setLayers((now) => ({ ...now, [layer]: on })),
    [],
  );
  const setTool = useCallback((next: Tool) => {
    setToolState(next);
    setLayers((now) => ({ ...now, line: next === 'line', mask: next === 'mask' || (next === 'layers' && now.mask) }));
  }, []);
  const change = useCallback(
    (part: Partial<typeof own>) => setOwn((now) => ({ ...(now.frameId === frameId ? now : {}), ...part, frameId })),
    [frameId],
  );
  const setLevels = useCallback((levels: Levels) => change({ levels }), [change]);
  const setSegment = useCallback((segment: LineSegment) => change({ segment }), [change]);
  const setChosenOrder = useCallback((order: number | null) => change({ order }), [change]);
  const firstOrder = measured?.rings.some((r) => r.kind === 'dark')
    ? Math.min(...measured.rings.filter((r) => r.kind === 'dark').map((r) => r.order))
    : null;

  return {
    view,
    setView,
    tool,
    setTool,
    tone,
    setTone,
    ownColour,
    setOwnColour,
    negative: negativeChoice ?? lightTheme,
    setNegative,
    layers,
    setLayer,
    levels: mine.levels ?? counts.fitting,
    setLevels,
    whole: counts.whole,
    table: counts.table,
    floorCounts: counts.floorCounts,
    segment: mine.segment ?? firstSegment,
    setSegment,
    chosenOrder: mine.order === undefined ? firstOrder : mine.order,
    setChosenOrder,
  };
}
