import { useCallback, useMemo } from 'react';
import { useLook } from '@/components/ui/useLook';
import type { Pen } from '@/components/viewer/Pen';
import type { SurfaceSize } from '@/components/viewer/PictureSurface';
import { bottom, right, type Box } from '@/components/viewer/place';
import { ChartFrame } from './ChartFrame';
import { comparePlot } from './compareGeometry';
import { pinnedNotes } from './pinnedNotes';
import type { ResidualStripProps } from './ResidualStrip';
import { axisText, decimalsOf, linearScale } from './scales';

/** Space that each order takes beside its neighbours over the same x, px. */
const ORDER_STEP_PX = 6;

/** What `ResidualStrip` shows once the drawing engine is there. */
export function ResidualDrawing({ points, xMax, limit, unit, chosenId, onChoose, heightPx = 116 }: ResidualStripProps) {
  const { colours } = useLook();
  const orders = useMemo(() => [...new Set(points.map((p) => p.order))].sort((a, b) => a - b), [points]);
  const notes = useMemo(() => pinnedNotes(points, limit, unit), [points, limit, unit]);

  const draw = useCallback(
    (pen: Pen, { width, height }: SurfaceSize) => {
      const box = stripBox(width, height);
      const x = linearScale(0, xMax * 1.1, box.left, right(box));
      const y = linearScale(-2.3 * limit, 2.3 * limit, bottom(box), box.top);
      pen.rect(box, colours.slotGap);
      for (const [top, foot] of [
        [box.top, y(limit)],
        [y(-limit), bottom(box)],
      ] as const) {
        const wall = { left: box.left, top, width: box.width, height: foot - top };
        pen.rect(wall, colours.wall);
        pen.hatch(wall, colours.rule, 5, 1.1);
      }
      const decimals = decimalsOf(limit);
      for (const value of [limit, -limit]) {
        pen.line(box.left, y(value), right(box), y(value), colours.ink2, 1.25);
        const text = (value > 0 ? '+' : '') + axisText(value, decimals);
        pen.text(text, box.left - 8, y(value) + 4, { color: colours.ink2, anchor: 'end' });
      }
      for (const p of points) {
        const px = x(p.x) + (orders.indexOf(p.order) - (orders.length - 1) / 2) * ORDER_STEP_PX;
        if (Math.abs(p.residual) > 2.2 * limit) {
          pen.caret(px, p.residual > 0 ? box.top + 8 : bottom(box) - 8, p.residual > 0, colours.ink0);
        } else if (p.leftOut) {
          pen.outline({ left: px - 2.6, top: y(p.residual) - 2.6, width: 5.2, height: 5.2 }, colours.ink0, 1.5);
        } else {
          pen.dot(px, y(p.residual), p.id === chosenId ? 4 : 2.6, p.id === chosenId ? colours.accent : colours.ink0);
        }
      }
      const half = (orders.length * ORDER_STEP_PX) / 2 + 6;
      for (const note of notes) {
        const words = pen.textWidth(note.text) + 10;
        const anchor = x(note.x);
        const left = anchor + half + words < right(box) ? anchor + half : anchor - half - words;
        if (left < box.left) continue;
        const top = note.high ? box.top + 1 : bottom(box) - 17;
        pen.rect({ left, top, width: words, height: 16 }, colours.wall);
        pen.text(note.text, left + 5, top + 12, { color: colours.ink1 });
      }
    },
    [colours, points, xMax, limit, chosenId, orders, notes],
  );
  const touch = useCallback(
    (px: number, _py: number, size: SurfaceSize) => {
      const box = stripBox(size.width, size.height);
      const x = linearScale(0, xMax * 1.1, box.left, right(box));
      const near = [...points].sort((a, b) => Math.abs(x(a.x) - px) - Math.abs(x(b.x) - px))[0];
      if (near && Math.abs(x(near.x) - px) < 28) onChoose?.(near.id);
    },
    [points, xMax, onChoose],
  );
  const words = notes.length > 0 ? ` ${notes.map((n) => n.text).join('. ')}.` : ` All within ${limit} ${unit}.`;
  return (
    <ChartFrame
      heightPx={heightPx}
      label={`Distance of ${points.length} radii from their lines.${words}`}
      draw={draw}
      onTouch={onChoose ? touch : undefined}
    />
  );
}

function stripBox(width: number, height: number): Box {
  const above = comparePlot(width, height);
  return { left: above.left, top: 6, width: above.width, height: height - 16 };
}
