import { useCallback } from 'react';
import { useLook } from '@/components/ui/useLook';
import type { Pen } from '@/components/viewer/Pen';
import type { SurfaceSize } from '@/components/viewer/PictureSurface';
import { bottom, right } from '@/components/viewer/place';
import { ChartFrame } from './ChartFrame';
import { decimalsOf, linearScale } from './scales';
import type { SizesChartProps } from './SizesChart';

const LABELS_PX = 72;

/** What `SizesChart` shows once the drawing engine is there. */
export function SizesDrawing({ sizes, total, meanUm, lowUm, highUm, heightPx = 200 }: SizesChartProps) {
  const { colours } = useLook();
  const draw = useCallback(
    (pen: Pen, { width, height }: SurfaceSize) => {
      const plot = { left: LABELS_PX, top: 6, width: width - LABELS_PX - 10, height: height - 34 };
      const x = linearScale(0.5, Math.max(total, 1) + 0.5, plot.left, right(plot));
      pen.rect(plot, colours.slotGap);
      drawPositions(pen);
      const known = sizes.filter((s) => s.sizeUm !== null);
      if (meanUm === null || lowUm === null || highUm === null || known.length === 0) return;
      const half = Math.max(highUm - meanUm, meanUm - lowUm, 1e-9);
      const y = linearScale(meanUm - 1.55 * half, meanUm + 1.55 * half, bottom(plot), plot.top);
      for (const [top, foot] of [
        [plot.top, y(highUm)],
        [y(lowUm), bottom(plot)],
      ] as const) {
        const wall = { left: plot.left, top, width: plot.width, height: foot - top };
        pen.rect(wall, colours.wall);
        pen.hatch(wall, colours.rule, 5, 1);
      }
      const decimals = Math.max(2, decimalsOf(half));
      for (const [value, ink] of [
        [highUm, colours.ink2],
        [meanUm, colours.ink0],
        [lowUm, colours.ink2],
      ] as const) {
        pen.text(value.toFixed(decimals), plot.left - 8, y(value) + 4, { color: ink, anchor: 'end' });
      }
      pen.line(plot.left, y(highUm), right(plot), y(highUm), colours.ink2, 1.25);
      pen.line(plot.left, y(lowUm), right(plot), y(lowUm), colours.ink2, 1.25);
      pen.line(plot.left, y(meanUm), right(plot), y(meanUm), colours.accent, 1.6);
      for (const size of sizes) {
        const px = x(size.position);
        if (size.sizeUm === null) continue;
        const off = size.sizeUm - meanUm;
        if (Math.abs(off) > 1.5 * half) {
          pen.caret(px, off > 0 ? plot.top + 7 : bottom(plot) - 7, off > 0, colours.ink0);
          continue;
        }
        const py = y(size.sizeUm);
        if (size.uncertaintyUm !== null) {
          pen.line(
            px,
            y(size.sizeUm + size.uncertaintyUm),
            px,
            y(size.sizeUm - size.uncertaintyUm),
            colours.ink0,
            1.25,
          );
        }
        if (size.leftOut) {
          const box = { left: px - 3.5, top: py - 3.5, width: 7, height: 7 };
          pen.rect(box, colours.slotGap);
          pen.outline(box, colours.ink0, 1.75);
        } else {
          pen.dot(px, py, 3.6, colours.ink0);
        }
      }

      function drawPositions(tool: Pen): void {
        const every = Math.max(1, Math.ceil((total * 22) / plot.width));
        for (let i = 1; i <= total; i += every) {
          tool.text(String(i), x(i), height - 8, { color: colours.ink2, anchor: 'middle' });
        }
      }
    },
    [colours, sizes, total, meanUm, lowUm, highUm],
  );
  const known = sizes.filter((s) => s.sizeUm !== null).length;
  const label =
    meanUm === null
      ? `No sizes yet of ${total} frames.`
      : `${known} sizes of ${total} frames; their mean is ${meanUm.toFixed(2)} µm.`;
  return <ChartFrame heightPx={heightPx} label={label} draw={draw} />;
}
