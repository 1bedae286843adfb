/**
 * Where the frame lies on the sheet: a frame point (x, y) in full-frame pixels, centres of pixels at whole numbers,
 * stands at (xPx + k·x, yPx + k·y) on the sheet. One scale for both directions.
 */
export interface Place {
  xPx: number;
  yPx: number;
  /** Sheet px for one frame pixel. */
  k: number;
}
export interface Point {
  x: number;
  y: number;
}
/** A rectangle on the sheet, px. */
export interface Box {
  left: number;
  top: number;
  width: number;
  height: number;
}

export const right = (box: Box): number => box.left + box.width;
export const bottom = (box: Box): number => box.top + box.height;
export const holds = (box: Box, p: Point): boolean =>
  p.x >= box.left && p.x < right(box) && p.y >= box.top && p.y < bottom(box);

/** Largest magnification: one frame pixel as wide as a fingertip. */
export const MAX_SCALE = 48;

export function toSheet(place: Place, frame: Point): Point {
  return { x: place.xPx + place.k * frame.x, y: place.yPx + place.k * frame.y };
}

export function toFrame(place: Place, sheet: Point): Point {
  return { x: (sheet.x - place.xPx) / place.k, y: (sheet.y - place.yPx) / place.k };
}

/** The whole frame in the middle of the box. */
export function placeWhole(box: Box, widthPx: number, heightPx: number): Place {
  const k = Math.min(box.width / widthPx, box.height / heightPx);
  return {
    k,
    xPx: box.left + (box.width - k * (widthPx - 1)) / 2,
    yPx: box.top + (box.height - k * (heightPx - 1)) / 2,
  };
}

/** The fitted centre at `at`, and a radius of `radiusPx` frame pixels reaching `reachPx` to the right of it. */
export function placeCentre(centre: Point, at: Point, radiusPx: number, reachPx: number): Place {
  const k = reachPx / radiusPx;
  return { k, xPx: at.x - k * centre.x, yPx: at.y - k * centre.y };
}

/** Magnifies by `factor` about a point of the sheet, which keeps its frame point; held between the two scales. */
export function zoomAbout(place: Place, sheet: Point, factor: number, minScale: number, maxScale = MAX_SCALE): Place {
  const k = Math.min(maxScale, Math.max(minScale, place.k * factor));
  const g = k / place.k;
  return { k, xPx: sheet.x - (sheet.x - place.xPx) * g, yPx: sheet.y - (sheet.y - place.yPx) * g };
}

/** Moves the frame, but never so far that less than `keepPx` of it stays in the box. */
export function pan(
  place: Place,
  dx: number,
  dy: number,
  box: Box,
  widthPx: number,
  heightPx: number,
  keepPx = 40,
): Place {
  return hold({ ...place, xPx: place.xPx + dx, yPx: place.yPx + dy }, box, widthPx, heightPx, keepPx);
}

export function hold(place: Place, box: Box, widthPx: number, heightPx: number, keepPx = 40): Place {
  const clamp = (start: number, from: number, size: number, lengthPx: number) =>
    Math.min(from + size - keepPx, Math.max(from + keepPx - place.k * lengthPx, start));
  return {
    k: place.k,
    xPx: clamp(place.xPx, box.left, box.width, widthPx),
    yPx: clamp(place.yPx, box.top, box.height, heightPx),
  };
}

export function samePlace(a: Place, b: Place): boolean {
  return Math.abs(a.k / b.k - 1) < 1e-9 && Math.abs(a.xPx - b.xPx) < 1e-6 && Math.abs(a.yPx - b.yPx) < 1e-6;
}
