/** Adds `bit` to every pixel within `margin` pixels (square neighbourhood) of one that has it. */
export function growMask(mask: Uint8Array, widthPx: number, heightPx: number, bit: number, margin: number): void {
  const rows = new Uint8Array(mask.length);
  for (let y = 0; y < heightPx; y++) {
    let last = -Infinity;
    const at = y * widthPx;
    for (let x = 0; x < widthPx; x++) {
      if (mask[at + x] & bit) last = x;
      if (x - last <= margin) rows[at + x] = 1;
    }
    last = Infinity;
    for (let x = widthPx - 1; x >= 0; x--) {
      if (mask[at + x] & bit) last = x;
      if (last - x <= margin) rows[at + x] = 1;
    }
  }
  for (let x = 0; x < widthPx; x++) {
    let last = -Infinity;
    for (let y = 0; y < heightPx; y++) {
      if (rows[y * widthPx + x]) last = y;
      if (y - last <= margin) mask[y * widthPx + x] |= bit;
    }
    last = Infinity;
    for (let y = heightPx - 1; y >= 0; y--) {
      if (rows[y * widthPx + x]) last = y;
      if (last - y <= margin) mask[y * widthPx + x] |= bit;
    }
  }
}
