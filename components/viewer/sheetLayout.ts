import type { Box } from './place';

/** Where everything lies on the sheet, px. One canvas holds all of it, so that a plumb can fall through. */
export interface SheetLayout {
  width: number;
  height: number;
  frame: Box;
  /** Angle across, radius up, on the height scale of the frame; only on a desk. */
  unwrapped: Box | null;
  /** Numbers of the rings between frame and profile. */
  tags: Box | null;
  plot: Box | null;
  strip: Box | null;
  /** Where the fitted centre stands when the sheet fits. */
  zeroX: number;
  centreY: number;
  /** Right edge of the space in which plumbs bend towards the rows of a table; null where there is no table. */
  gutterRight: number | null;
  /** Left edge of the words beside the axes. */
  wordsX: number;
  wide: boolean;
}

const TAGS_PX = 24;

/** Frame over profile over misfit, as on a phone and in an evidence panel. Heights of 0 leave a part out. */
export function stackLayout(
  width: number,
  frameHeight: number,
  chartHeight: number,
  misfitHeight: number,
): SheetLayout {
  const labels = width < 360 ? 72 : 84;
  const across = { left: labels, width: width - labels - 6 };
  const charted = chartHeight > 0;
  const chartTop = frameHeight + TAGS_PX;
  return {
    width,
    height: frameHeight + (charted ? TAGS_PX + chartHeight + (misfitHeight > 0 ? misfitHeight + 2 : 0) : 0),
    frame: { left: 0, top: 0, width, height: frameHeight },
    unwrapped: null,
    tags: charted ? { left: 0, top: frameHeight, width, height: TAGS_PX } : null,
    plot: charted ? { ...across, top: chartTop + 4, height: chartHeight - 28 } : null,
    strip: charted && misfitHeight > 0 ? { ...across, top: chartTop + chartHeight + 2, height: misfitHeight } : null,
    zeroX: labels,
    centreY: Math.round(frameHeight * 0.52),
    gutterRight: null,
    wordsX: width < 360 ? 8 : 14,
    wide: false,
  };
}

const DESK_TAGS_PX = 26;
const DESK_CHART_PX = 206;
const DESK_STRIP_PX = 56;
const DESK_FOOT_PX = 20;
const GUTTER_PX = 22;

/** Height of what lies under the frame on a desk, px. */
export const DESK_LOWER_PX = DESK_TAGS_PX + DESK_CHART_PX + 8 + DESK_STRIP_PX + DESK_FOOT_PX;

/** The projection sheet: frame and unwrapped view on one height scale, profile and misfit on one width scale. */
export function deskLayout(width: number, height: number, charted: boolean): SheetLayout {
  const unwrappedWidth = charted ? Math.round(Math.min(212, Math.max(150, width * 0.27))) : 0;
  const frameWidth = charted ? width - unwrappedWidth - 2 - GUTTER_PX : width;
  const frameHeight = Math.max(220, height - DESK_LOWER_PX);
  const labels = Math.round(Math.min(112, Math.max(84, frameWidth * 0.2)));
  const across = { left: labels, width: frameWidth - labels - 8 };
  const chartTop = frameHeight + DESK_TAGS_PX;
  const centreY = frameHeight - 62;
  return {
    width,
    height: frameHeight + DESK_LOWER_PX,
    frame: { left: 0, top: 0, width: frameWidth, height: frameHeight },
    unwrapped: charted ? { left: frameWidth + 2, top: 0, width: unwrappedWidth, height: centreY } : null,
    tags: { left: 0, top: frameHeight, width: frameWidth, height: DESK_TAGS_PX },
    plot: { ...across, top: chartTop + 6, height: 174 },
    strip: { ...across, top: chartTop + DESK_CHART_PX + 8, height: DESK_STRIP_PX },
    zeroX: labels,
    centreY,
    gutterRight: charted ? width : null,
    wordsX: 16,
    wide: true,
  };
}
