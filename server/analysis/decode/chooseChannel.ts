/** Channels in the order of their names, for what is said to the operator. */
const NAMES = ['red', 'green', 'blue'];

/**
 * One plane out of interleaved colour samples. Channels that agree everywhere give that plane; else the channel that
 * responds most to the laser (largest range between its median and its brightest thousandth) is taken alone, because
 * mixing channels would mix their saturation and their noise.
 * @param samples interleaved, length pixels * channels
 * @param channels samples per pixel; a channel after the colours (alpha) is not looked at
 */
export function chooseChannel(
  samples: Uint8Array | Uint16Array,
  pixels: number,
  channels: number,
): { data: Uint16Array; note: string | null; colour: boolean } {
  const colours = channels >= 3 ? 3 : 1;
  const plane = (channel: number) => {
    const data = new Uint16Array(pixels);
    for (let i = 0, p = channel; i < pixels; i++, p += channels) data[i] = samples[p];
    return data;
  };
  if (colours === 1) return { data: plane(0), note: null, colour: false };
  let equal = true;
  for (let i = 0, p = 0; i < pixels && equal; i++, p += channels) {
    equal = samples[p] === samples[p + 1] && samples[p] === samples[p + 2];
  }
  if (equal) return { data: plane(0), note: 'All colour channels are equal; one of them was measured.', colour: false };
  const step = Math.max(1, Math.floor(pixels / 200_000));
  let best = 0;
  let bestRange = -1;
  for (let c = 0; c < 3; c++) {
    const some: number[] = [];
    for (let i = 0; i < pixels; i += step) some.push(samples[i * channels + c]);
    some.sort((a, b) => a - b);
    const range = some[Math.floor(some.length * 0.999)] - some[some.length >> 1];
    if (range > bestRange) {
      bestRange = range;
      best = c;
    }
  }
  return {
    data: plane(best),
    note: `Of the colour picture the ${NAMES[best]} channel was measured, which responds most to the laser.`,
    colour: true,
  };
}
