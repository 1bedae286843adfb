import { drawLineProfile } from '@/components/charts/drawLineProfile';
import {
  drawMisfitStrip,
  drawPlumb,
  drawProfile,
  drawRingTags,
  radiusXs,
  type RadialAxis,
} from '@/components/charts/drawProfile';
import { countRange, profileSeries, reachMm } from '@/components/charts/profileSeries';
import { drawFrame } from './drawFrame';
import { drawLineHandle } from './drawLineHandle';
import type { Pen } from './Pen';
import { bottom, right, toSheet, type Box, type Point } from './place';
import type { MeasuredFrame, SheetScene } from './SheetScene';

/** A dashed circle larger than this would take longer to dash than to draw. */
const MAX_DASHED_RADIUS_PX = 2500;

/** Draws the whole sheet: frame, unwrapped view, plumbs, profile and misfit. */
export function drawSheet(pen: Pen, scene: SheetScene): void {
  const { layout, measured } = scene;
  pen.rect({ left: 0, top: 0, width: layout.width, height: layout.height }, scene.colours.gap);
  const foot = bottom(layout.frame);
  pen.rect({ left: 0, top: foot, width: layout.frame.width, height: layout.height - foot }, scene.ground);
  pen.rect(layout.frame, scene.onFrame.gap);
  const unwrapped = scene.view === 'unwrapped' && measured !== null;
  const pane: Box = unwrapped
    ? { ...layout.frame, left: layout.zeroX, width: right(layout.frame) - layout.zeroX }
    : layout.frame;
  pen.clipped(pane, () => drawFrame(pen, scene, pane, unwrapped ? 1 : 0));
  if (layout.unwrapped && measured) {
    const box = layout.unwrapped;
    pen.clipped(box, () => drawFrame(pen, scene, box, 2));
  }
  const below = layout.plot !== null && (scene.below === 'line' || measured !== null);
  if (measured) {
    const centre = toSheet(scene.place, measured.centrePx);
    const axis = radialAxis(scene, measured);
    if (unwrapped) drawAngles(pen, scene);
    else drawRings(pen, scene, centre, axis);
    drawPlumbs(pen, scene, axis, unwrapped ? pane.top : centre.y);
    if (layout.unwrapped) drawSidePlumbs(pen, scene, centre, axis);
    if (below && scene.below === 'radial') drawRadial(pen, scene, measured, axis);
  }
  if (below && scene.below === 'line') drawAlong(pen, scene);
  if (scene.layers.line && scene.segment && !unwrapped) {
    const { segment } = scene;
    pen.clipped(layout.frame, () => drawLineHandle(pen, scene.onFrame, scene.place, segment));
  }
}

/** The profile's scale across is the frame's: the centre stands over its zero. */
export function radialAxis(scene: Pick<SheetScene, 'place'>, measured: MeasuredFrame): RadialAxis {
  return {
    zeroX: scene.place.xPx + scene.place.k * measured.centrePx.x,
    pxPerMm: scene.place.k / (measured.pixelPitchUm / 1000),
  };
}

function drawRings(pen: Pen, scene: SheetScene, centre: Point, axis: RadialAxis): void {
  const { onFrame, layers, layout } = scene;
  pen.clipped(layout.frame, () => {
    for (const ring of scene.dark) {
      const chosen = ring.order === scene.chosenOrder;
      const fitted = ring.predictedMm * axis.pxPerMm;
      const own = ring.radiusMm * axis.pxPerMm;
      const dash = (radius: number) => (radius < MAX_DASHED_RADIUS_PX ? ('sparse-dots' as const) : ('solid' as const));
      if (chosen) pen.ring(centre, own, onFrame.ink0, 1.5);
      else if (layers.fitted) pen.ring(centre, fitted, onFrame.ink2, 1, dash(fitted));
      if (layers.measured && !chosen)
        pen.ring(centre, own, onFrame.ink1, 1, own < MAX_DASHED_RADIUS_PX ? 'dashes' : 'solid');
      const ink = chosen ? onFrame.ink0 : onFrame.ink2;
      for (const x of radiusXs(axis, ring.radiusMm, layout.frame)) pen.line(x - 4, centre.y, x + 4, centre.y, ink, 1.5);
      if (layout.unwrapped) pen.line(centre.x, centre.y - own - 4, centre.x, centre.y - own + 4, ink, 1.5);
    }
    if (layers.centre) {
      const ink = scene.negative === (scene.theme === 'light') ? scene.colours.onAccent : scene.colours.ink0;
      pen.line(centre.x - 8, centre.y, centre.x + 8, centre.y, ink, 1.5);
      pen.line(centre.x, centre.y - 8, centre.x, centre.y + 8, ink, 1.5);
    }
  });
}

/** Plumbs fall from the rings on the right of the centre through the tags to the head of the profile. */
function drawPlumbs(pen: Pen, scene: SheetScene, axis: RadialAxis, fromY: number): void {
  const { layout, colours, onFrame } = scene;
  const foot = bottom(layout.frame);
  const top = Math.min(foot, Math.max(layout.frame.top, fromY));
  const from = layout.plot ? { ...layout.frame, left: layout.plot.left, width: layout.plot.width } : layout.frame;
  const radial = layout.plot !== null && scene.below === 'radial';
  const unwrapped = scene.view === 'unwrapped';
  for (const ring of scene.dark) {
    const chosen = ring.order === scene.chosenOrder;
    if (!radial && !unwrapped && !chosen) continue;
    for (const x of radiusXs(axis, ring.radiusMm, from)) {
      pen.line(x, top, x, foot, chosen ? colours.accent : onFrame.ink2, chosen ? 2 : 1, chosen ? 'solid' : 'dots');
      if (!radial || !layout.plot) continue;
      drawPlumb(pen, colours, x, foot, bottom(layout.plot), chosen);
    }
  }
}

/** On a desk each ring also runs sideways through the unwrapped view to its row of the table. */
function drawSidePlumbs(pen: Pen, scene: SheetScene, centre: Point, axis: RadialAxis): void {
  const { layout, onFrame, colours } = scene;
  const box = layout.unwrapped;
  if (!box || layout.gutterRight === null) return;
  for (const ring of scene.dark) {
    const y = centre.y - ring.radiusMm * axis.pxPerMm;
    if (y < box.top || y > bottom(box)) continue;
    const chosen = ring.order === scene.chosenOrder;
    const ink = chosen ? colours.accent : onFrame.ink2;
    const width = chosen ? 2 : 1;
    const dash = chosen ? ('solid' as const) : ('dots' as const);
    pen.line(Math.max(layout.frame.left, centre.x), y, right(box), y, ink, width, dash);
    const rowY = scene.rowYs.get(ring.order);
    if (rowY === undefined) continue;
    const outer = chosen ? colours.accent : colours.ink3;
    const bend = right(box) + 6;
    const turn = layout.gutterRight - 5;
    pen.line(right(box), y, bend, y, outer, width, dash);
    pen.line(bend, y, turn, rowY, outer, width, dash);
    pen.line(turn, rowY, layout.gutterRight, rowY, outer, width, dash);
  }
}

function drawAngles(pen: Pen, scene: SheetScene): void {
  const { frame, zeroX, wordsX } = scene.layout;
  const ink = { color: scene.colours.ink2 };
  pen.text('Angle', wordsX, frame.top + 14, ink);
  for (const part of [0, 0.25, 0.5, 0.75, 1]) {
    const y = Math.min(bottom(frame) - 4, Math.max(frame.top + 14, frame.top + frame.height * part + 4));
    pen.text(`${360 * part}°`, zeroX - 8, y, { ...ink, anchor: 'end' });
  }
}

function drawRadial(pen: Pen, scene: SheetScene, measured: MeasuredFrame, axis: RadialAxis): void {
  const { layout, colours, dark } = scene;
  const { plot, strip, tags, wordsX, wide } = layout;
  if (!plot || !tags) return;
  const reach = Math.max(
    reachMm(
      measured.profile,
      dark.map((r) => r.radiusMm),
    ),
    (right(plot) - axis.zeroX) / axis.pxPerMm,
  );
  const end = Math.min(reach, measured.profile.radiusMm[measured.profile.radiusMm.length - 1] ?? reach);
  const series = profileSeries(measured.profile, axis.pxPerMm);
  drawProfile(pen, colours, { plot, axis, series, range: countRange(measured.profile), reachMm: end });
  if (strip) {
    const plumbs = dark.flatMap((ring) =>
      radiusXs(axis, ring.radiusMm, strip).map((x) => ({ x, chosen: ring.order === scene.chosenOrder })),
    );
    drawMisfitStrip(pen, colours, strip, axis, series, end, plumbs);
    pen.text('Misfit', wordsX, strip.top + strip.height / 2 + 4, { color: colours.ink2 });
  }
  const heads = dark.flatMap((ring) => radiusXs(axis, ring.radiusMm, plot).map((x) => ({ order: ring.order, x })));
  drawRingTags(pen, colours, tags, heads, scene.chosenOrder);
  pen.text(wide ? 'Dark ring' : 'Ring', wordsX, tags.top + tags.height / 2 + 4.5, { color: colours.ink2 });
  pen.text('Counts', wordsX, plot.top + 8, { color: colours.ink2 });
  pen.text(wide && plot.left >= 100 ? 'Radius, mm' : 'mm', wordsX, bottom(plot) + 18, { color: colours.ink2 });
}

function drawAlong(pen: Pen, scene: SheetScene): void {
  const { layout, colours, measured, plane } = scene;
  const { plot, strip, wordsX } = layout;
  if (!plot || !plane) return;
  const tall = strip ? { ...plot, height: bottom(strip) - plot.top - 24 } : plot;
  const pitch = measured?.pixelPitchUm ?? null;
  if (scene.line) {
    drawLineProfile(pen, colours, {
      plot: tall,
      line: scene.line,
      pixelPitchUm: pitch,
      blackCount: plane.blackCount,
      logarithmic: scene.tone === 'log',
    });
  }
  pen.text('Counts', wordsX, tall.top + 8, { color: colours.ink2 });
  pen.text(pitch === null ? 'Pixels' : 'mm', wordsX, bottom(tall) + 18, { color: colours.ink2 });
}
