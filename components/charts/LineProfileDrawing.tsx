import { useCallback } from 'react';
import { useLook } from '@/components/ui/useLook';
import type { Pen } from '@/components/viewer/Pen';
import type { SurfaceSize } from '@/components/viewer/PictureSurface';
import { ChartFrame } from './ChartFrame';
import { drawLineProfile } from './drawLineProfile';
import type { LineProfileChartProps } from './LineProfileChart';

/** What `LineProfileChart` shows once the drawing engine is there. */
export function LineProfileDrawing({ line, pixelPitchUm, blackCount, heightPx = 196 }: LineProfileChartProps) {
  const { colours } = useLook();
  const unit = pixelPitchUm === null ? 'pixels' : 'mm';
  const draw = useCallback(
    (pen: Pen, { width, height }: SurfaceSize) => {
      const plot = { left: 72, top: 10, width: width - 80, height: height - 36 };
      drawLineProfile(pen, colours, { plot, line, pixelPitchUm, blackCount, logarithmic: true });
      pen.text('Counts', 8, plot.top + 6, { color: colours.ink2 });
      pen.text(unit, 8, height - 8, { color: colours.ink2 });
    },
    [colours, line, pixelPitchUm, blackCount, unit],
  );
  return (
    <ChartFrame
      heightPx={heightPx}
      label={`Counts above black along the line, ${line.distancePx.length} steps, in ${unit}.`}
      draw={draw}
    />
  );
}
