import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';

/** Part of a frame that fits one texture. The core is what the tile draws; the apron around it feeds interpolation. */
export interface TileExtent {
  /** Frame pixel of the tile's first texel. */
  left: number;
  top: number;
  widthPx: number;
  heightPx: number;
  /** Core in frame pixels: from (inclusive) to (exclusive). */
  coreLeft: number;
  coreTop: number;
  coreRight: number;
  coreBottom: number;
}

/** Textures over this side are avoided even where a device says that it takes them. */
export const TILE_SIDE_PX = 4096;
const APRON_PX = 4;

/** Cuts a frame in tiles whose sides, aprons included, stay within `maxSidePx`. */
export function tileExtents(widthPx: number, heightPx: number, maxSidePx = TILE_SIDE_PX): TileExtent[] {
  const spans = (length: number): { from: number; to: number; coreFrom: number; coreTo: number }[] => {
    if (length <= maxSidePx) return [{ from: 0, to: length, coreFrom: 0, coreTo: length }];
    const count = Math.ceil(length / (maxSidePx - 2 * APRON_PX));
    const step = Math.ceil(length / count);
    return Array.from({ length: count }, (_, i) => {
      const coreFrom = i * step;
      const coreTo = Math.min(length, coreFrom + step);
      return { from: Math.max(0, coreFrom - APRON_PX), to: Math.min(length, coreTo + APRON_PX), coreFrom, coreTo };
    });
  };
  const columns = spans(widthPx);
  return spans(heightPx).flatMap((r) =>
    columns.map((c) => ({
      left: c.from,
      top: r.from,
      widthPx: c.to - c.from,
      heightPx: r.to - r.from,
      coreLeft: c.coreFrom,
      coreTop: r.coreFrom,
      coreRight: c.coreTo,
      coreBottom: r.coreTo,
    })),
  );
}

/**
 * Texels of a tile, four bytes each: high byte of the count, low byte, misfit byte (0 where there is none), 255.
 * A texture of floating numbers would cut counts to 11 bits or fewer on the way to the screen; bytes arrive whole.
 */
export function packTile(plane: FramePlane, misfit: MisfitPlane | null, tile: TileExtent): Uint8Array {
  const out = new Uint8Array(tile.widthPx * tile.heightPx * 4);
  const columnScale = misfit ? misfit.widthPx / plane.widthPx : 0;
  const rowScale = misfit ? misfit.heightPx / plane.heightPx : 0;
  let o = 0;
  for (let row = tile.top; row < tile.top + tile.heightPx; row += 1) {
    let i = row * plane.widthPx + tile.left;
    const misfitRow = misfit ? Math.floor((row + 0.5) * rowScale) * misfit.widthPx : 0;
    for (let column = tile.left; column < tile.left + tile.widthPx; column += 1, i += 1, o += 4) {
      const count = plane.data[i]!;
      out[o] = count >> 8;
      out[o + 1] = count & 255;
      out[o + 2] = misfit ? misfit.bytes[misfitRow + Math.floor((column + 0.5) * columnScale)]! : 0;
      out[o + 3] = 255;
    }
  }
  return out;
}
