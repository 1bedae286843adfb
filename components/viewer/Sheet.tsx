import type { Ref } from 'react';
import type { LineSegment } from '@/shared/optics/lineProfile';
import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';
import type { Levels, Tone } from './levels';
import type { Place, Point } from './place';
import type { SheetLayout } from './sheetLayout';
import type { MeasuredFrame, SheetLayers, SheetView } from './SheetScene';
import { SkiaGate } from './SkiaGate';

/** What a screen can ask of the sheet. */
export interface SheetHandle {
  zoom(factor: number): void;
  /** The fitted centre over the profile's zero; without a measurement the whole frame. */
  fit(): void;
  /** The whole frame. */
  whole(): void;
}

export interface SheetProps {
  layout: SheetLayout;
  plane: FramePlane | null;
  misfit: MisfitPlane | null;
  measured: MeasuredFrame | null;
  wavelengthNm: number | null;
  /** False: the neutral map. */
  ownColour: boolean;
  /** Light drawn as ink. */
  negative: boolean;
  view: SheetView;
  tone: Tone;
  levels: Levels;
  /** Where the logarithm turns over, counts: about the noise of a dark pixel. */
  floorCounts: number;
  layers: SheetLayers;
  below: 'radial' | 'line';
  segment: LineSegment | null;
  onSegment?: (segment: LineSegment) => void;
  chosenOrder: number | null;
  onChooseRing?: (order: number | null) => void;
  /** Point under the pointer in full-frame pixels; null when it leaves the frame. */
  onHover?: (frame: Point | null) => void;
  /** Where the frame lies, after it has moved. */
  onPlace?: (place: Place) => void;
  /** Heights between which the rows of a ring table stand beside the sheet; plumbs bend to them. */
  rowsBetween?: { top: number; foot: number };
  /** False: the sheet is only looked at and touched, it neither moves nor takes the wheel from the page. */
  movable?: boolean;
  label: string;
  handle?: Ref<SheetHandle>;
}

const load = () => import('./drawings').then((m) => m.drawings.sheet);

/** Frame, unwrapped view, profile and misfit on one canvas, so that plumbs fall through all of them. */
export function Sheet(props: SheetProps) {
  return <SkiaGate load={load} componentProps={props} heightPx={props.layout.height} />;
}
