import { AlphaType, ColorType, Skia } from '@shopify/react-native-skia';
import { ColourStrip, FrameTexture } from '@/components/viewer/FrameTexture';
import { frameEffect, packUniforms, type FrameUniforms } from '@/components/viewer/frameShader';
import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';

const plain: Omit<FrameUniforms, 'tileOrigin' | 'tileSize' | 'core' | 'frameSize' | 'pane'> = {
  place: [0.5, 0.5, 1],
  centre: [0, 0],
  mapping: 0,
  show: 0,
  levels: [0, 255],
  tone: 0,
  floorCounts: 1,
  white: 65536,
  masks: 0,
  density: 1,
  maxTaps: 4,
  hatchInk: [1, 1, 1],
  maskInk: [0, 0, 1],
  above: [1, 0, 0],
  below: [0, 1, 0],
  ground: [0, 0, 0],
};
const greys = Uint8Array.from({ length: 768 }, (_, i) => Math.floor(i / 3));

/** Draws the frame with the shader on the main processor and gives the red channel, row by row. */
function render(
  plane: FramePlane,
  misfit: MisfitPlane | null,
  change: Partial<FrameUniforms>,
  width: number,
  height: number,
  maxSidePx?: number,
): Uint8Array {
  const surface = Skia.Surface.Make(width, height)!;
  const texture = new FrameTexture(plane, misfit, maxSidePx);
  const strip = new ColourStrip(greys);
  const paint = Skia.Paint();
  for (const { extent, shader } of texture.tiles) {
    const uniforms = packUniforms({
      ...plain,
      pane: [0, 0, width, height],
      frameSize: [plane.widthPx, plane.heightPx],
      tileOrigin: [extent.left, extent.top],
      tileSize: [extent.widthPx, extent.heightPx],
      core: [extent.coreLeft, extent.coreTop, extent.coreRight, extent.coreBottom],
      ...change,
    });
    paint.setShader(frameEffect().makeShaderWithChildren(uniforms, [shader, strip.shader]));
    surface.getCanvas().drawRect(Skia.XYWHRect(0, 0, width, height), paint);
  }
  surface.flush();
  const pixels = surface
    .makeImageSnapshot()
    .readPixels(0, 0, { width, height, alphaType: AlphaType.Unpremul, colorType: ColorType.RGBA_8888 }) as Uint8Array;
  texture.dispose();
  strip.dispose();
  return pixels;
}
const red = (pixels: Uint8Array, width: number, x: number, y: number) => pixels[4 * (y * width + x)]!;
const ramp: FramePlane = {
  widthPx: 256,
  heightPx: 256,
  data: Uint16Array.from({ length: 65536 }, (_, i) => i),
  blackCount: 0,
  whiteCount: 65535,
};

test('the shader takes as many numbers as are packed for it', () => {
  const count = packUniforms({
    ...plain,
    pane: [0, 0, 1, 1],
    frameSize: [1, 1],
    tileOrigin: [0, 0],
    tileSize: [1, 1],
    core: [0, 0, 1, 1],
  }).length;
  expect(frameEffect().getUniformFloatCount()).toBe(count);
});

test.each([0, 255 * 77, 255 * 200, 65535 - 255])(
  'of 16 bits, each of the 256 counts from %i on gets a grey of its own',
  (low) => {
    const pixels = render(ramp, null, { levels: [low, low + 255] }, 256, 256);
    for (let i = 0; i <= 255; i += 1) {
      const index = low + i;
      expect(red(pixels, 256, index % 256, Math.floor(index / 256))).toBe(i);
    }
  },
);

test('between pixels counts are interpolated, not their bytes', () => {
  // 255 and 256 share no byte: a blend of bytes would come out far off.
  const plane: FramePlane = {
    widthPx: 2,
    heightPx: 1,
    data: Uint16Array.of(255, 256),
    blackCount: 0,
    whiteCount: 65535,
  };
  const pixels = render(plane, null, { place: [2, 0.5, 4], levels: [254, 257] }, 8, 1);
  for (let x = 2; x <= 5; x += 1) {
    const frameX = (x + 0.5 - 2) / 4;
    expect(red(pixels, 8, x, 0)).toBeCloseTo((255 * (255 + frameX - 254)) / 3, -0.5);
  }
});

test('a reduced view averages the pixels that it covers', () => {
  const plane: FramePlane = {
    widthPx: 4,
    heightPx: 4,
    data: Uint16Array.from({ length: 16 }, (_, i) => (i % 2) * 200),
    blackCount: 0,
    whiteCount: 65535,
  };
  const pixels = render(plane, null, { place: [0.125, 0.125, 0.25], levels: [0, 255] }, 1, 1);
  expect(red(pixels, 1, 0, 0)).toBe(100);
});

test('tiles meet without a seam', () => {
  const whole = render(ramp, null, { place: [0.3, 0.7, 1], levels: [0, 65535] }, 250, 250);
  const tiled = render(ramp, null, { place: [0.3, 0.7, 1], levels: [0, 65535] }, 250, 250, 100);
  expect(Buffer.from(tiled).equals(Buffer.from(whole))).toBe(true);
});

test('unwrapped, radius runs across or up and angle counter-clockwise from the direction of x', () => {
  const size = 101;
  const disc: FramePlane = {
    widthPx: size,
    heightPx: size,
    data: Uint16Array.from({ length: size * size }, (_, i) => {
      const dx = (i % size) - 50;
      const dy = Math.floor(i / size) - 50;
      return Math.hypot(dx, dy) < 20 ? 200 : dy < 0 ? 100 : 0;
    }),
    blackCount: 0,
    whiteCount: 65535,
  };
  const across = render(disc, null, { mapping: 1, centre: [50, 50], place: [-50, 0, 1] }, 48, 36);
  expect(red(across, 48, 5, 3)).toBe(200);
  expect(red(across, 48, 30, 9)).toBe(100);
  expect(red(across, 48, 30, 27)).toBe(0);
  const up = render(disc, null, { mapping: 2, centre: [50, 50], place: [0, -10, 1] }, 36, 40);
  expect(red(up, 36, 3, 35)).toBe(200);
  expect(red(up, 36, 9, 10)).toBe(100);
  expect(red(up, 36, 27, 10)).toBe(0);
});

test('clipped pixels are hatched, not coloured', () => {
  const plane: FramePlane = {
    widthPx: 16,
    heightPx: 16,
    data: new Uint16Array(256).fill(4095),
    blackCount: 0,
    whiteCount: 4095,
  };
  const pixels = render(plane, null, { white: 4095, levels: [0, 8190] }, 16, 16);
  const values = new Set(Array.from({ length: 256 }, (_, i) => red(pixels, 16, i % 16, Math.floor(i / 16))));
  expect(values.has(255)).toBe(true);
  expect([...values].some((v) => v > 100 && v < 140)).toBe(true);
});

test('misfit above the model takes one colour, below it the other, and zero the ground', () => {
  const plane: FramePlane = { widthPx: 3, heightPx: 1, data: new Uint16Array(3), blackCount: 0, whiteCount: 65535 };
  const misfit: MisfitPlane = { widthPx: 3, heightPx: 1, bytes: Uint8Array.of(128 + 60, 128, 128 - 60) };
  const pixels = render(plane, misfit, { show: 1 }, 3, 1);
  expect([...pixels.slice(0, 3)]).toEqual([255, 0, 0]);
  expect([...pixels.slice(4, 7)]).toEqual([0, 0, 0]);
  expect([...pixels.slice(8, 11)]).toEqual([0, 255, 0]);
});

test('outside the frame nothing is drawn', () => {
  const plane: FramePlane = {
    widthPx: 2,
    heightPx: 2,
    data: new Uint16Array(4).fill(255),
    blackCount: 0,
    whiteCount: 65535,
  };
  const pixels = render(plane, null, { place: [2.5, 2.5, 1] }, 6, 6);
  expect(pixels[3]).toBe(0);
  expect(pixels[4 * (2 * 6 + 2) + 3]).toBe(255);
});
