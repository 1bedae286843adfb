import type { Colours } from '@/components/ui/tokens';
import type { Pen } from '@/components/viewer/Pen';
import { bottom, right, type Box } from '@/components/viewer/place';
import type { ProfileSeries } from './profileSeries';
import { axisText, decades, decimalsOf, linearScale, logScale, marks, niceStep } from './scales';

/** Where radius lies across: the fitted centre stands over the profile's zero. Left of it the profile is mirrored. */
export interface RadialAxis {
  zeroX: number;
  pxPerMm: number;
}

export interface Plumb {
  order: number;
  radiusMm: number;
}

/** All x of a radius that lie in the box: to the right of the centre, and mirrored to the left where there is room. */
export function radiusXs(axis: RadialAxis, radiusMm: number, box: Box): number[] {
  const xs = [axis.zeroX + radiusMm * axis.pxPerMm];
  if (axis.zeroX > box.left + 1 && radiusMm > 0) xs.push(axis.zeroX - radiusMm * axis.pxPerMm);
  return xs.filter((x) => x >= box.left - 0.5 && x <= right(box) + 0.5);
}

export function drawPlumb(pen: Pen, colours: Colours, x: number, top: number, foot: number, chosen: boolean): void {
  pen.line(x, top, x, foot, chosen ? colours.accent : colours.ink3, chosen ? 2 : 1, chosen ? 'solid' : 'dots');
}

/** Numbers of the dark rings at the heads of their plumbs; the chosen one in an accent tag. Crowded ones are left out. */
export function drawRingTags(
  pen: Pen,
  colours: Colours,
  strip: Box,
  tags: readonly { order: number; x: number }[],
  chosenOrder: number | null,
): void {
  const base = strip.top + strip.height / 2 + 4.5;
  const chosen = tags.find((t) => t.order === chosenOrder);
  let lastX = -Infinity;
  for (const tag of tags) {
    if (tag === chosen || tag.x - lastX < 15 || (chosen && Math.abs(tag.x - chosen.x) < 21)) continue;
    pen.text(String(tag.order), tag.x, base, { color: colours.ink2, size: 13, anchor: 'middle' });
    lastX = tag.x;
  }
  if (!chosen) return;
  const half = chosen.order > 9 ? 13 : 11;
  pen.rect({ left: chosen.x - half, top: strip.top + 2, width: 2 * half, height: strip.height - 4 }, colours.accent);
  pen.text(String(chosen.order), chosen.x, base, { color: colours.onAccent, size: 13, bold: true, anchor: 'middle' });
}

interface ProfileDrawing {
  /** The plot itself; labels stand left of it and below it. */
  plot: Box;
  axis: RadialAxis;
  series: ProfileSeries;
  range: { from: number; to: number };
  reachMm: number;
}

/** Counts against radius on a logarithmic scale: measured dots with bars over the model. */
export function drawProfile(pen: Pen, colours: Colours, { plot, axis, series, range, reachMm }: ProfileDrawing): void {
  const foot = bottom(plot);
  const y = logScale(range.from, range.to, foot, plot.top);
  const end = Math.min(right(plot), axis.zeroX + reachMm * axis.pxPerMm);
  const begin = axis.zeroX > plot.left ? Math.max(plot.left, axis.zeroX - reachMm * axis.pxPerMm) : plot.left;
  let lastY = Infinity;
  for (const decade of decades(range.from, range.to)) {
    pen.line(plot.left, y(decade), right(plot), y(decade), colours.rule, 1, 'solid', 0.55);
    if (lastY - y(decade) < 14) continue;
    lastY = y(decade);
    const text = decade < 1 ? axisText(decade, Math.round(-Math.log10(decade))) : String(decade);
    pen.text(text, plot.left - 8, y(decade) + 4, { color: colours.ink2, anchor: 'end' });
  }
  pen.clipped({ left: plot.left, top: plot.top - 6, width: plot.width, height: plot.height + 6 }, () => {
    for (const side of axis.zeroX > plot.left + 1 ? [1, -1] : [1]) {
      const xs = series.radiusMm.map((r) => axis.zeroX + side * r * axis.pxPerMm);
      const model = series.modelCounts.map(y);
      pen.band(
        xs,
        series.modelCounts.map((c, i) => y(c + 2 * series.standardErrorCounts[i]!)),
        series.modelCounts.map((c, i) => y(c - 2 * series.standardErrorCounts[i]!)),
        colours.soft,
        0.55,
      );
      pen.polyline(xs, model, colours.accent, 1.6);
      for (let i = 0; i < xs.length; i += 1) {
        const x = xs[i]!;
        if (x < plot.left - 2 || x > right(plot) + 2) continue;
        const mean = series.meanCounts[i]!;
        const error = series.standardErrorCounts[i]!;
        if (mean <= range.from) {
          pen.caret(x, foot - 4, false, colours.ink2);
          continue;
        }
        const top = y(mean + error);
        const low = y(mean - error);
        if (low - top > 3) pen.line(x, top, x, low, colours.ink0, 1);
        pen.dot(x, y(mean), 1.2, colours.ink0);
      }
    }
  });
  drawRadiusAxis(pen, colours, plot, axis, begin, end);
}

/** Radius in millimetres along the foot of a plot. */
export function drawRadiusAxis(
  pen: Pen,
  colours: Colours,
  plot: Box,
  axis: RadialAxis,
  begin: number,
  end: number,
): void {
  const foot = bottom(plot);
  pen.line(begin, foot, end, foot, colours.ink3, 1);
  const step = niceStep(axis.pxPerMm, 56);
  const decimals = decimalsOf(step);
  const fromMm = (begin - axis.zeroX) / axis.pxPerMm;
  const toMm = (end - axis.zeroX) / axis.pxPerMm;
  for (const mm of marks(fromMm, toMm, step / 2)) {
    const x = axis.zeroX + mm * axis.pxPerMm;
    pen.line(x, foot, x, foot + 5, colours.ink3, 1);
    if (Math.abs(mm / step - Math.round(mm / step)) > 1e-6) continue;
    const text = axisText(Math.abs(mm), decimals);
    const half = pen.textWidth(text) / 2;
    pen.text(text, Math.min(Math.max(x, plot.left - 4 + half), right(plot) - half), foot + 18, {
      color: colours.ink2,
      anchor: 'middle',
    });
  }
}

const MISFIT_SPAN = 4;

/** Misfit of the dots under their profile: a slot of ± 2; what lies far outside is pinned with a caret and counted. */
export function drawMisfitStrip(
  pen: Pen,
  colours: Colours,
  box: Box,
  axis: RadialAxis,
  series: ProfileSeries,
  reachMm: number,
  plumbs: readonly { x: number; chosen: boolean }[],
): void {
  const y = linearScale(-MISFIT_SPAN, MISFIT_SPAN, bottom(box), box.top);
  const end = Math.min(right(box), axis.zeroX + reachMm * axis.pxPerMm);
  const begin = axis.zeroX > box.left ? Math.max(box.left, axis.zeroX - reachMm * axis.pxPerMm) : box.left;
  const wall = (top: number, foot: number) => {
    const part = { left: begin, top, width: end - begin, height: foot - top };
    pen.rect(part, colours.wall);
    pen.hatch(part, colours.rule, 5, 1);
  };
  pen.rect({ left: begin, top: box.top, width: end - begin, height: box.height }, colours.slotGap);
  wall(box.top, y(2));
  wall(y(-2), bottom(box));
  pen.line(begin, y(2), end, y(2), colours.ink3);
  pen.line(begin, y(-2), end, y(-2), colours.ink3);
  pen.text('+2', box.left - 8, y(2) + 4, { color: colours.ink2, anchor: 'end' });
  pen.text('−2', box.left - 8, y(-2) + 4, { color: colours.ink2, anchor: 'end' });

  for (const plumb of plumbs) drawPlumb(pen, colours, plumb.x, box.top, bottom(box), plumb.chosen);
  let pinned = 0;
  let worst = 0;
  let worstX = 0;
  pen.clipped({ left: begin, top: box.top, width: end - begin, height: box.height }, () => {
    for (let i = 0; i < series.misfit.length; i += 1) {
      const value = series.misfit[i]!;
      const out = Math.abs(value) > MISFIT_SPAN * 0.95;
      const xs = radiusXs(axis, series.radiusMm[i]!, box);
      for (const x of xs) {
        if (out) pen.caret(x, value > 0 ? box.top + 5 : bottom(box) - 5, value > 0, colours.ink0);
        else pen.dot(x, y(value), 1.4, colours.ink1);
      }
      if (out && xs.length > 0) {
        pinned += 1;
        if (Math.abs(value) > Math.abs(worst)) {
          worst = value;
          worstX = xs[0]!;
        }
      }
    }
  });
  if (pinned === 0) return;
  const signed = `${worst > 0 ? '+' : '−'}${Math.abs(worst).toFixed(1)}`;
  const words = pinned === 1 ? signed : `${signed}, ${pinned} outside`;
  const width = pen.textWidth(words, 12) + 10;
  const roomRight = worstX + 8 + width < end;
  const left = roomRight ? worstX + 8 : Math.max(begin, worstX - 8 - width);
  const top = worst > 0 ? box.top : bottom(box) - 14;
  pen.rect({ left, top, width, height: 14 }, colours.wall);
  pen.text(words, left + 5, top + 11, { color: colours.ink1 });
}
