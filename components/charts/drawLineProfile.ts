import type { Colours } from '@/components/ui/tokens';
import type { Pen } from '@/components/viewer/Pen';
import { bottom, right, type Box } from '@/components/viewer/place';
import type { LineProfile } from '@/shared/contracts/lineProfile';
import { axisText, decades, decimalsOf, linearScale, logScale, marks, niceStep } from './scales';

interface LineDrawing {
  plot: Box;
  line: LineProfile;
  /** Null: distance in pixels. */
  pixelPitchUm: number | null;
  blackCount: number;
  logarithmic: boolean;
}

/** Counts above black along a line, with the standard error of each mean as a bar. */
export function drawLineProfile(
  pen: Pen,
  colours: Colours,
  { plot, line, pixelPitchUm, blackCount, logarithmic }: LineDrawing,
): void {
  const foot = bottom(plot);
  const toUnit = pixelPitchUm === null ? 1 : pixelPitchUm / 1000;
  const length = (line.distancePx[line.distancePx.length - 1] ?? 0) * toUnit;
  const above = line.meanCounts.map((c) => (c === null ? NaN : c - blackCount));
  const known = above.filter((c) => Number.isFinite(c));
  if (known.length < 2 || length <= 0) {
    pen.text('Draw the line over the frame.', plot.left + 4, plot.top + 20, { color: colours.ink2 });
    return;
  }
  const peak = Math.max(...known, 1);
  const least = Math.min(...known);
  const from = logarithmic ? Math.max(peak * 1e-5, 0.5) : Math.min(0, least);
  const to = logarithmic ? peak * 1.7 : peak * 1.08;
  const y = logarithmic ? logScale(from, to, foot, plot.top) : linearScale(from, to, foot, plot.top);
  const x = linearScale(0, length, plot.left, right(plot));

  const step = logarithmic ? 0 : niceStep(plot.height / (to - from), 34);
  for (const value of logarithmic ? decades(from, to) : marks(from, to, step)) {
    pen.line(plot.left, y(value), right(plot), y(value), colours.rule, 1, 'solid', 0.55);
    const text = axisText(value, logarithmic ? (value < 1 ? 1 : 0) : decimalsOf(step));
    pen.text(text, plot.left - 8, y(value) + 4, { color: colours.ink2, anchor: 'end' });
  }
  pen.clipped({ left: plot.left, top: plot.top - 6, width: plot.width, height: plot.height + 6 }, () => {
    const every = Math.max(1, Math.floor(line.distancePx.length / (plot.width / 2)));
    const xs: number[] = [];
    const ys: number[] = [];
    for (let i = 0; i < above.length; i += 1) {
      const px = x(line.distancePx[i]! * toUnit);
      const counts = above[i]!;
      xs.push(px);
      ys.push(y(counts));
      const error = line.standardErrorCounts[i];
      if (error && i % every === 0) pen.line(px, y(counts + error), px, y(counts - error), colours.ink2, 1);
    }
    pen.polyline(xs, ys, colours.ink0, 1.2);
  });
  pen.line(plot.left, foot, right(plot), foot, colours.ink3, 1);
  const across = niceStep(plot.width / length, 56);
  for (const value of marks(0, length, across / 2)) {
    pen.line(x(value), foot, x(value), foot + 5, colours.ink3, 1);
    if (Math.abs(value / across - Math.round(value / across)) > 1e-6) continue;
    const text = axisText(value, decimalsOf(across));
    pen.text(text, Math.min(x(value), right(plot) - pen.textWidth(text) / 2), foot + 18, {
      color: colours.ink2,
      anchor: 'middle',
    });
  }
}
