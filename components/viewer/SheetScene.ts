import type { Colours } from '@/components/ui/tokens';
import type { ThemeName } from '@/hooks/theme/ThemeProvider';
import type { LineProfile } from '@/shared/contracts/lineProfile';
import type { RadialProfile, Ring } from '@/shared/contracts/measureResult';
import type { FramePlane } from '@/shared/optics/framePlane';
import type { LineSegment } from '@/shared/optics/lineProfile';
import type { ColourStrip, FrameTexture } from './FrameTexture';
import type { Levels, Tone } from './levels';
import type { Place, Point } from './place';
import type { SheetLayout } from './sheetLayout';

export type SheetView = 'frame' | 'unwrapped' | 'misfit';

/** What a measurement says of its frame, as far as the sheet draws it. */
export interface MeasuredFrame {
  /** Full-frame pixels. */
  centrePx: Point;
  rings: readonly Ring[];
  profile: RadialProfile;
  pixelPitchUm: number;
}

export interface SheetLayers {
  fitted: boolean;
  measured: boolean;
  centre: boolean;
  mask: boolean;
  line: boolean;
}
export const defaultLayers: SheetLayers = { fitted: true, measured: false, centre: true, mask: false, line: false };

/** Everything that one drawing of the sheet needs. */
export interface SheetScene {
  layout: SheetLayout;
  place: Place;
  plane: FramePlane | null;
  texture: FrameTexture | null;
  strip: ColourStrip;
  hasMisfit: boolean;
  measured: MeasuredFrame | null;
  dark: readonly Ring[];
  chosenOrder: number | null;
  view: SheetView;
  tone: Tone;
  levels: Levels;
  floorCounts: number;
  layers: SheetLayers;
  segment: LineSegment | null;
  line: LineProfile | null;
  /** What stands under the frame. */
  below: 'radial' | 'line';
  /** y on the sheet of the table row of each dark ring, by order; empty where there is no table. */
  rowYs: ReadonlyMap<number, number>;
  colours: Colours;
  /** Colours for what lies on the frame: those of the theme that its ground resembles. */
  onFrame: Colours;
  /** What the charts stand on. */
  ground: string;
  theme: ThemeName;
  negative: boolean;
  density: number;
  /** Samples that are averaged for one screen pixel, along each side. */
  maxTaps: number;
}
