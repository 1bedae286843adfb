import { useCallback, useMemo } from 'react';
import { useLook } from '@/components/ui/useLook';
import type { Pen } from '@/components/viewer/Pen';
import type { SurfaceSize } from '@/components/viewer/PictureSurface';
import { ChartFrame } from './ChartFrame';
import { drawMisfitStrip, drawPlumb, drawProfile, drawRingTags, radiusXs } from './drawProfile';
import type { ProfileChartProps } from './ProfileChart';
import { countRange, profileSeries, reachMm } from './profileSeries';
import { darkRings, ringNear, stepRing } from './ringChoice';

const TAGS_PX = 24;
const MISFIT_PX = 48;
const LABELS_PX = 72;

/** What `ProfileChart` shows once the drawing engine is there. */
export function ProfileDrawing({
  profile,
  rings,
  chosenOrder,
  onChooseRing,
  heightPx = 270,
  misfit = true,
}: ProfileChartProps) {
  const { colours } = useLook();
  const dark = useMemo(() => darkRings(rings), [rings]);
  const reach = useMemo(
    () =>
      reachMm(
        profile,
        dark.map((r) => r.radiusMm),
      ),
    [profile, dark],
  );
  const range = useMemo(() => countRange(profile), [profile]);

  const draw = useCallback(
    (pen: Pen, { width, height }: SurfaceSize) => {
      const foot = height - (misfit ? MISFIT_PX + 26 : 24);
      const plot = { left: LABELS_PX, top: TAGS_PX + 8, width: width - LABELS_PX - 8, height: foot - TAGS_PX - 8 };
      const axis = { zeroX: plot.left, pxPerMm: plot.width / reach };
      const series = profileSeries(profile, axis.pxPerMm);
      const strip = { left: plot.left, top: height - MISFIT_PX, width: plot.width, height: MISFIT_PX };
      const tags = dark.flatMap((ring) => radiusXs(axis, ring.radiusMm, plot).map((x) => ({ order: ring.order, x })));
      const plumbs = tags.map(({ order, x }) => ({ x, chosen: order === chosenOrder }));
      if (misfit) drawMisfitStrip(pen, colours, strip, axis, series, reach, plumbs);
      for (const plumb of plumbs) drawPlumb(pen, colours, plumb.x, TAGS_PX, foot, plumb.chosen);
      drawProfile(pen, colours, { plot, axis, series, range, reachMm: reach });
      drawRingTags(pen, colours, { left: 0, top: 0, width, height: TAGS_PX }, tags, chosenOrder);
      pen.text('Ring', 8, TAGS_PX / 2 + 4.5, { color: colours.ink2 });
      pen.text('Counts', 8, plot.top + 6, { color: colours.ink2 });
      pen.text('mm', 8, foot + 18, { color: colours.ink2 });
      if (misfit) pen.text('Misfit', 8, strip.top + MISFIT_PX / 2 + 4, { color: colours.ink2 });
    },
    [colours, profile, dark, reach, range, chosenOrder, misfit],
  );
  const touch = useCallback(
    (x: number, _y: number, size: SurfaceSize) => {
      const pxPerMm = (size.width - LABELS_PX - 8) / reach;
      const order = ringNear(dark, x - LABELS_PX, pxPerMm, 22);
      if (order !== null) onChooseRing?.(order === chosenOrder ? null : order);
    },
    [dark, reach, onChooseRing, chosenOrder],
  );
  const chosen = dark.find((r) => r.order === chosenOrder);
  const chosenText = chosen ? `dark ring ${chosen.order}, ${chosen.radiusMm.toFixed(4)} mm` : 'no ring chosen';
  return (
    <ChartFrame
      heightPx={heightPx}
      label={`Counts against radius on a logarithmic scale, with the fitted model and ${dark.length} dark rings; ${chosenText}.`}
      draw={draw}
      onTouch={onChooseRing ? touch : undefined}
      onStep={onChooseRing && dark.length > 0 ? (by) => onChooseRing(stepRing(dark, chosenOrder, by)) : undefined}
      choice={{ now: chosen ? dark.indexOf(chosen) + 1 : 0, count: dark.length, text: chosenText }}
    />
  );
}
