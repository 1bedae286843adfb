import { useCallback, useMemo } from 'react';
import { useLook } from '@/components/ui/useLook';
import type { Pen } from '@/components/viewer/Pen';
import type { SurfaceSize } from '@/components/viewer/PictureSurface';
import { bottom, right, type Box } from '@/components/viewer/place';
import { ChartFrame } from './ChartFrame';
import { compareExtent, comparePlot, nearestPoint } from './compareGeometry';
import type { CompareChartProps } from './CompareChart';
import { axisText, decimalsOf, linearScale, marks, niceStep } from './scales';

/** What `CompareChart` shows once the drawing engine is there. */
export function CompareDrawing(props: CompareChartProps) {
  const { lines, points, xTicks, xTitle, yTitle, edgeY, edgeLabel = 'edge of the sensor', chosenId, onChoose } = props;
  const heightPx = props.heightPx ?? 560;
  const { colours } = useLook();
  const extent = useMemo(() => compareExtent(points, edgeY), [points, edgeY]);

  const draw = useCallback(
    (pen: Pen, { width, height }: SurfaceSize) => {
      const plot = comparePlot(width, height);
      const foot = bottom(plot);
      const x = linearScale(0, extent.x, plot.left, right(plot));
      const y = linearScale(0, extent.y, foot, plot.top);
      const ceiling = edgeY === null ? plot.top : y(edgeY);
      const open: Box = { left: plot.left, top: ceiling, width: plot.width, height: foot - ceiling };
      pen.rect(open, colours.slotGap);
      if (edgeY !== null) {
        const wall = { left: plot.left, top: plot.top, width: plot.width, height: ceiling - plot.top };
        pen.rect(wall, colours.wall);
        pen.hatch(wall, colours.rule, 6, 1.1);
        pen.line(plot.left, ceiling, right(plot), ceiling, colours.ink2, 1.5);
        const middle = (plot.top + ceiling) / 2;
        const words = pen.textWidth(edgeLabel);
        pen.rect({ left: right(plot) - words - 22, top: middle - 9, width: words + 16, height: 18 }, colours.wall);
        pen.text(edgeLabel, right(plot) - 14, middle + 4, { color: colours.ink2, anchor: 'end' });
      }
      const step = niceStep(plot.height / extent.y, 70);
      for (const value of marks(0, edgeY ?? extent.y, step)) {
        pen.line(plot.left - 4, y(value), plot.left, y(value), colours.ink3, 1);
        pen.text(axisText(value, decimalsOf(step)), plot.left - 8, y(value) + 4, {
          color: colours.ink2,
          anchor: 'end',
        });
      }
      pen.line(plot.left, ceiling, plot.left, foot, colours.ink3, 1);
      pen.line(plot.left, foot, right(plot), foot, colours.ink3, 1);
      drawTicks(pen, plot, x);
      pen.text(yTitle, 12, plot.top - 12, { color: colours.ink2 });
      pen.text(xTitle, right(plot), foot + 42, { color: colours.ink2, anchor: 'end' });

      const ordered = [...lines].sort((a, b) => a.order - b.order);
      pen.clipped({ left: open.left, top: open.top, width: open.width + 1, height: open.height + 1 }, () => {
        ordered.forEach((line, i) => {
          pen.line(
            x(0),
            y(line.intercept),
            x(extent.x),
            y(line.intercept + line.slope * extent.x),
            colours.accent,
            i === 0 ? 2 : 1.4,
          );
        });
      });
      drawLineNames(pen, ordered, open, x, y);
      for (const p of points) {
        const px = x(p.x);
        const py = y(p.y);
        if (px > right(plot) + 1 || py < ceiling - 1) continue;
        const chosen = p.id === chosenId;
        const dx = Math.max(6, x(p.xUncertainty) - x(0));
        const dy = Math.max(6, y(0) - y(p.yUncertainty));
        pen.line(px - dx, py, px + dx, py, colours.ink0, p.leftOut || chosen ? 2 : 1.5);
        pen.line(px, py - dy, px, py + dy, colours.ink0, p.leftOut || chosen ? 2 : 1.5);
        if (p.leftOut) {
          const box = { left: px - 3.5, top: py - 3.5, width: 7, height: 7 };
          pen.rect(box, colours.slotGap);
          pen.outline(box, colours.ink0, 1.75);
        } else {
          pen.dot(px, py, chosen ? 4.2 : 3, colours.ink0);
        }
        if (chosen) pen.ring({ x: px, y: py }, 9, colours.accent, 2);
      }

      function drawTicks(tool: Pen, box: Box, scale: (v: number) => number): void {
        let lastEnd = [-Infinity, -Infinity];
        for (const tick of [...xTicks].sort((a, b) => a.x - b.x)) {
          const px = scale(tick.x);
          if (px < box.left - 1 || px > right(box) + 1) continue;
          const half = tool.textWidth(tick.label) / 2;
          const row = px - half > lastEnd[0]! + 6 ? 0 : px - half > lastEnd[1]! + 6 ? 1 : null;
          tool.line(px, bottom(box), px, bottom(box) + 6, colours.ink2, 1.5);
          if (row === null) continue;
          lastEnd = lastEnd.map((end, i) => (i === row ? px + half : end));
          tool.text(tick.label, px, bottom(box) + 20 + 15 * row, { color: colours.ink1, anchor: 'middle' });
        }
      }

      function drawLineNames(
        tool: Pen,
        all: typeof ordered,
        box: Box,
        sx: (v: number) => number,
        sy: (v: number) => number,
      ): void {
        let lastLeft = Infinity;
        all.forEach((line, i) => {
          if (line.slope <= 0) return;
          const top = box.top;
          const reaches = (edgeY ?? extent.y) < line.intercept + line.slope * extent.x;
          if (i === 0) {
            const atY = Math.max(top + 18, sy(line.intercept + line.slope * extent.x * 0.86) + 40);
            tool.text(`dark ring ${line.order}`, right(box) - 8, Math.min(atY, bottom(box) - 8), {
              color: colours.ink1,
              size: 13,
              bold: true,
              anchor: 'end',
            });
            return;
          }
          const px = reaches ? sx(((edgeY ?? extent.y) - line.intercept) / line.slope) + 6 : right(box) - 12;
          const py = reaches ? top + 17 : sy(line.intercept + line.slope * extent.x) + 18;
          if (Math.abs(px - lastLeft) < 14) return;
          lastLeft = px;
          tool.text(String(line.order), px, py, { color: colours.ink1, size: 13, bold: true });
        });
      }
    },
    [colours, extent, lines, points, xTicks, xTitle, yTitle, edgeY, edgeLabel, chosenId],
  );
  const touch = useCallback(
    (px: number, py: number, size: SurfaceSize) => {
      const id = nearestPoint(points, extent, comparePlot(size.width, size.height), px, py);
      if (id !== null) onChoose?.(id);
    },
    [points, extent, onChoose],
  );
  const ids = useMemo(() => [...new Set([...points].sort((a, b) => a.x - b.x).map((p) => p.id))], [points]);
  const at = chosenId === null ? -1 : ids.indexOf(chosenId);
  const name = points.find((p) => p.id === chosenId)?.label;
  return (
    <ChartFrame
      heightPx={heightPx}
      label={`${yTitle} against ${xTitle}: ${points.length} ring radii of ${ids.length} measurements on ${lines.length} lines.`}
      draw={draw}
      onTouch={onChoose ? touch : undefined}
      onStep={
        onChoose && ids.length > 0
          ? (by) => onChoose(ids[Math.min(ids.length - 1, Math.max(0, at < 0 ? 0 : at + by))]!)
          : undefined
      }
      choice={{ now: at + 1, count: ids.length, text: name ?? 'none chosen' }}
    />
  );
}
