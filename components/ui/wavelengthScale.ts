const firstNm = 380;
const lastNm = 720;

/** Where a wavelength stands on the rule, px from the left; held at the ends outside 380 to 720 nm. */
export function wavelengthX(wavelengthNm: number, widthPx: number, marginPx: number): number {
  const held = Math.min(lastNm, Math.max(firstNm, wavelengthNm));
  return marginPx + ((held - firstNm) / (lastNm - firstNm)) * (widthPx - 2 * marginPx);
}

/** Path of the tick marks; the ticks under the laser's mark are left out. */
export function wavelengthTicks(widthPx: number, marginPx: number, stepNm: number, laserNm: number | null): string {
  const clearNm = stepNm * 0.55;
  let path = '';
  for (let nm = firstNm; nm <= lastNm; nm += stepNm) {
    if (laserNm !== null && Math.abs(nm - laserNm) < clearNm) continue;
    const length = nm % 50 === 0 ? 10 : nm % 10 === 0 ? 6 : 3.5;
    path += `M${wavelengthX(nm, widthPx, marginPx).toFixed(2)} 0v${length}`;
  }
  return path;
}
