import { packTile, tileExtents } from '@/components/viewer/planeTiles';

test('a frame that fits is one tile', () => {
  expect(tileExtents(4096, 100)).toEqual([
    { left: 0, top: 0, widthPx: 4096, heightPx: 100, coreLeft: 0, coreTop: 0, coreRight: 4096, coreBottom: 100 },
  ]);
});

test('tiles of a large frame stay within the side, and their cores cover each pixel once', () => {
  const width = 9504;
  const height = 6336;
  const tiles = tileExtents(width, height);
  expect(tiles).toHaveLength(6);
  let area = 0;
  for (const t of tiles) {
    expect(t.widthPx).toBeLessThanOrEqual(4096);
    expect(t.heightPx).toBeLessThanOrEqual(4096);
    expect(t.left).toBeLessThanOrEqual(t.coreLeft);
    expect(t.left + t.widthPx).toBeGreaterThanOrEqual(t.coreRight);
    area += (t.coreRight - t.coreLeft) * (t.coreBottom - t.coreTop);
  }
  expect(area).toBe(width * height);
});

test('all 65 536 counts survive packing', () => {
  const plane = {
    widthPx: 256,
    heightPx: 256,
    data: Uint16Array.from({ length: 65536 }, (_, i) => i),
    blackCount: 0,
    whiteCount: 65535,
  };
  const [tile] = tileExtents(256, 256);
  const texels = packTile(plane, null, tile!);
  for (let i = 0; i < 65536; i += 1) {
    if (texels[4 * i]! * 256 + texels[4 * i + 1]! !== i) throw new Error(`count ${i} was changed`);
    if (texels[4 * i + 2] !== 0 || texels[4 * i + 3] !== 255)
      throw new Error(`texel ${i} has a wrong third or fourth byte`);
  }
});

test('misfit of a coarser plane is taken from the pixel that covers it', () => {
  const plane = { widthPx: 4, heightPx: 2, data: new Uint16Array(8), blackCount: 0, whiteCount: 1 };
  const misfit = { widthPx: 2, heightPx: 1, bytes: Uint8Array.of(7, 200) };
  const [tile] = tileExtents(4, 2);
  const texels = packTile(plane, misfit, tile!);
  expect([0, 1, 2, 3].map((i) => texels[4 * i + 2])).toEqual([7, 7, 200, 200]);
});

test('a tile in the middle begins at its own pixel', () => {
  const plane = {
    widthPx: 20,
    heightPx: 20,
    data: Uint16Array.from({ length: 400 }, (_, i) => i),
    blackCount: 0,
    whiteCount: 999,
  };
  const tiles = tileExtents(20, 20, 16);
  const last = tiles[tiles.length - 1]!;
  const texels = packTile(plane, null, last);
  expect(texels[0]! * 256 + texels[1]!).toBe(last.top * 20 + last.left);
});
