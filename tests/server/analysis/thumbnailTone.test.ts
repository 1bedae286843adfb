import { inspectFrame } from '../../../server/analysis/inspectFrame';
import { simulateDark } from '../../../server/simulator/simulateDark';
import { simulatePinhole } from '../../../server/simulator/simulatePinhole';
import { BENCH, graymap, SENSOR } from './simulatedCase';

const { widthPx, heightPx } = SENSOR;
/** Near enough that four dark rings lie on the frame. */
const NEARER = { ...BENCH, distanceMm: 50 };
/** The thumbnail is 192 × 160: one of its pixels is 1.875 pixels of the frame. */
const SCALE = 192 / widthPx;

async function toneOf(counts: Uint16Array, whiteCount = 4095, camera: object = { bitDepth: 12 }) {
  const { thumbnailTone } = await inspectFrame(graymap(counts, widthPx, heightPx, whiteCount), camera);
  const sorted = Uint8Array.from(thumbnailTone.bytes).sort();
  return {
    ...thumbnailTone,
    median: sorted[sorted.length >> 1],
    highest: sorted[Math.floor(sorted.length * 0.999)],
    /** Mean tone on a circle about the pattern's centre. */
    around: (radiusPx: number) => {
      let sum = 0;
      for (let k = 0; k < 60; k++) {
        const x = BENCH.centrePx.x + radiusPx * Math.cos((k * Math.PI) / 30);
        const y = BENCH.centrePx.y + radiusPx * Math.sin((k * Math.PI) / 30);
        sum += thumbnailTone.bytes[Math.floor(y * SCALE) * thumbnailTone.widthPx + Math.floor(x * SCALE)] / 60;
      }
      return sum;
    },
  };
}

/** Radius in pixels of v = k a sin θ on the bench of the simulated frames, small angles. */
const radiusPx = (v: number) =>
  (v * NEARER.wavelengthNm * 1e-6 * NEARER.distanceMm) /
  ((Math.PI * NEARER.diameterUm) / 1000) /
  (SENSOR.pixelPitchUm / 1000);

test.each([
  ['of little noise', SENSOR],
  ['of much noise', { ...SENSOR, readNoiseElectrons: 30 }],
  ['with dark signal', { ...SENSOR, darkElectrons: 400, darkUnevennessElectrons: 40 }],
  ['of 8 bits', { ...SENSOR, bitDepth: 8, electronsPerCount: 60, blackCount: 4 }],
])('a dark %s is dark', async (_, sensor) => {
  const { median, highest } = await toneOf(simulateDark({ sensor, seed: 3 }), 2 ** sensor.bitDepth - 1, {
    bitDepth: sensor.bitDepth,
  });
  expect(median).toBeLessThan(64);
  expect(highest).toBeLessThan(150);
});

test('a frame without any range is dark, not noise and not white', async () => {
  for (const level of [0, 64]) expect((await toneOf(new Uint16Array(widthPx * heightPx).fill(level))).highest).toBe(0);
});

test.each([
  ['exposed well', 12_000],
  ['exposed little', 1500],
])('a pinhole frame %s shows its rings', async (_, peakElectrons) => {
  const tone = await toneOf(simulatePinhole({ ...NEARER, peakElectrons }).light);
  // Bright rings 1 to 3 stand above the dark rings on both sides: zeros of J2 and J1 (A&S table 9.5, from memory).
  const dark = [3.832, 7.016, 10.173, 13.324].map((v) => tone.around(radiusPx(v)));
  const bright = [5.136, 8.417].map((v) => tone.around(radiusPx(v)));
  bright.forEach((level, ring) => {
    expect(level).toBeGreaterThan(dark[ring] + 12);
    expect(level).toBeGreaterThan(dark[ring + 1] + 12);
  });
  expect(tone.around(0)).toBeGreaterThan(240);
  expect(tone.median).toBeLessThan(110);
});

test('an over-exposed frame is bright where it is clipped', async () => {
  const light = simulatePinhole({ ...NEARER, peakElectrons: 400_000 }).light;
  const tone = await toneOf(light);
  expect(tone.around(0)).toBe(255);
  expect(tone.around(radiusPx(5.136))).toBeGreaterThan(180);
  expect(tone.median).toBeGreaterThan(20);
});

test('a frame that is clipped everywhere is white', async () => {
  expect((await toneOf(new Uint16Array(widthPx * heightPx).fill(4095))).median).toBeGreaterThan(200);
});
