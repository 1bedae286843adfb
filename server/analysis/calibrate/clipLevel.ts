/** Pixels on one level that make a flat top. */
const MANY = 30;
/** How many times more of them than on the levels beneath. */
const CROWD = 6;

/**
 * The lowest count at which the sensor clips: the nominal white level, or a flat top below it (a full well, a limiter).
 * A flat top shows as a crowd of pixels on the highest level that occurs, or just under it, far more than on the levels
 * beneath. Hot pixels above a flat top do not hide it.
 * @param data counts as stored
 * @param whiteCount nominal white level
 */
export function clipLevel(
  data: Uint16Array | Float32Array,
  whiteCount: number,
): { clipCount: number; flatTop: boolean } {
  const top = Math.ceil(whiteCount);
  const bins = Math.min(65_536, Math.max(2, top + 1));
  const width = (top + 1) / bins;
  const histogram = new Uint32Array(bins);
  for (let i = 0; i < data.length; i++) {
    const bin = Math.floor(data[i] / width);
    histogram[bin < 0 ? 0 : bin >= bins ? bins - 1 : bin]++;
  }
  const needed = Math.max(MANY, data.length * 2e-5);
  const reach = Math.max(8, Math.floor(bins / 64));
  let above = 0;
  for (let b = bins - 1; b > bins / 8 && above < data.length * 1e-3; b--) {
    const here = histogram[b];
    if (here >= needed) {
      let beneath = 0;
      for (let k = 2; k < reach + 2; k++) beneath += histogram[b - k] ?? 0;
      if (here > (CROWD * beneath) / reach + CROWD * Math.sqrt(beneath / reach + 1)) {
        return { clipCount: b * width, flatTop: b * width < whiteCount * 0.999 };
      }
    }
    above += here;
  }
  return { clipCount: whiteCount, flatTop: false };
}
