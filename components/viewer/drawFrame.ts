import { Skia } from '@shopify/react-native-skia';
import { frameEffect, packUniforms, type FrameUniforms } from './frameShader';
import { tones } from './levels';
import type { Pen } from './Pen';
import type { Box } from './place';
import type { SheetScene } from './SheetScene';

type Colour3 = readonly [number, number, number];
const parts = (colour: string): Colour3 => {
  const [r = 0, g = 0, b = 0] = Skia.Color(colour);
  return [r, g, b];
};

/** Where each screen point of a pane comes from: as it lies, radius across, or angle across. */
export type Mapping = FrameUniforms['mapping'];

/** Draws the pixels of the frame, or their misfit, into a pane of the sheet. */
export function drawFrame(pen: Pen, scene: SheetScene, pane: Box, mapping: Mapping): void {
  const { texture, plane, place, measured, colours, onFrame, levels } = scene;
  if (!texture || !plane) return;
  const centre = measured?.centrePx ?? { x: (plane.widthPx - 1) / 2, y: (plane.heightPx - 1) / 2 };
  const effect = frameEffect();
  for (const { extent, shader } of texture.tiles) {
    const uniforms = packUniforms({
      tileOrigin: [extent.left, extent.top],
      tileSize: [extent.widthPx, extent.heightPx],
      core: [extent.coreLeft, extent.coreTop, extent.coreRight, extent.coreBottom],
      pane: [pane.left, pane.top, pane.width, pane.height],
      place: [place.xPx, place.yPx, place.k],
      centre: [centre.x, centre.y],
      frameSize: [plane.widthPx, plane.heightPx],
      mapping,
      show: scene.view === 'misfit' && scene.hasMisfit ? 1 : 0,
      levels: [levels.low, levels.high],
      tone: tones.indexOf(scene.tone) as FrameUniforms['tone'],
      floorCounts: scene.floorCounts,
      white: plane.whiteCount,
      masks: scene.layers.mask && scene.hasMisfit ? 1 : 0,
      density: scene.density,
      maxTaps: scene.maxTaps,
      hatchInk: parts(scene.negative ? onFrame.lift : onFrame.ink0),
      maskInk: parts(onFrame.ink1),
      above: parts(colours.accent),
      below: parts(onFrame.ink1),
      ground: parts(scene.negative ? onFrame.lift : onFrame.gap),
    });
    const painted = effect.makeShaderWithChildren(uniforms, [shader, scene.strip.shader]);
    pen.shaded(pane, painted);
    painted.dispose();
  }
}
