import {
  AlphaType,
  ColorType,
  FilterMode,
  MipmapMode,
  Skia,
  TileMode,
  type SkImage,
  type SkShader,
} from '@shopify/react-native-skia';
import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';
import { packTile, tileExtents, TILE_SIDE_PX, type TileExtent } from './planeTiles';

interface Tile {
  extent: TileExtent;
  image: SkImage;
  shader: SkShader;
}

/** A frame in the memory of the drawing engine, in tiles. `dispose` must be called: nothing else frees it. */
export class FrameTexture {
  readonly tiles: readonly Tile[];

  /** @throws Error when the engine cannot hold the frame. */
  constructor(
    readonly plane: FramePlane,
    misfit: MisfitPlane | null,
    maxSidePx = TILE_SIDE_PX,
  ) {
    const tiles: Tile[] = [];
    for (const extent of tileExtents(plane.widthPx, plane.heightPx, maxSidePx)) {
      const image = imageOf(packTile(plane, misfit, extent), extent.widthPx, extent.heightPx);
      if (!image) {
        for (const tile of tiles) release(tile);
        throw new Error('The frame does not fit the memory of the drawing engine.');
      }
      tiles.push({ extent, image, shader: nearest(image) });
    }
    this.tiles = tiles;
  }

  dispose(): void {
    for (const tile of this.tiles) release(tile);
  }
}

function release(tile: Tile): void {
  tile.shader.dispose();
  tile.image.dispose();
}

function imageOf(texels: Uint8Array, width: number, height: number): SkImage | null {
  const data = Skia.Data.fromBytes(texels);
  const image = Skia.Image.MakeImage(
    { width, height, alphaType: AlphaType.Opaque, colorType: ColorType.RGBA_8888 },
    data,
    width * 4,
  );
  data.dispose();
  return image;
}

/** Packed bytes must never be blended by the sampler. */
function nearest(image: SkImage): SkShader {
  return image.makeShaderOptions(TileMode.Clamp, TileMode.Clamp, FilterMode.Nearest, MipmapMode.None);
}

/** A colour map of 256 entries (R, G, B bytes) as a strip that the frame shader looks its tones up in. */
export class ColourStrip {
  private readonly image: SkImage;
  readonly shader: SkShader;

  constructor(map: Uint8Array) {
    const texels = new Uint8Array(256 * 4);
    for (let i = 0; i < 256; i += 1) {
      texels[4 * i] = map[3 * i]!;
      texels[4 * i + 1] = map[3 * i + 1]!;
      texels[4 * i + 2] = map[3 * i + 2]!;
      texels[4 * i + 3] = 255;
    }
    const image = imageOf(texels, 256, 1);
    if (!image) throw new Error('The colour map could not be made.');
    this.image = image;
    this.shader = image.makeShaderOptions(TileMode.Clamp, TileMode.Clamp, FilterMode.Linear, MipmapMode.None);
  }

  dispose(): void {
    this.shader.dispose();
    this.image.dispose();
  }
}
