import { frameHealthSchema } from '../../../shared/contracts/captures';
import { inspectFrame } from '../../../server/analysis/inspectFrame';
import { simulatePinhole } from '../../../server/simulator/simulatePinhole';
import { BENCH, graymap, SENSOR } from './simulatedCase';

const inspect = async (peakElectrons: number) => {
  const { light } = simulatePinhole({ ...BENCH, peakElectrons });
  return {
    light,
    inspection: await inspectFrame(graymap(light, SENSOR.widthPx, SENSOR.heightPx, 4095), { bitDepth: 12 }),
  };
};

test('a good frame: counts as they are, health and thumbnail', async () => {
  const { light, inspection } = await inspect(12_000);
  expect(inspection).toMatchObject({
    format: 'PGM, 16-bit',
    widthPx: 360,
    heightPx: 300,
    bitDepth: 12,
    exposureMs: null,
  });
  expect(inspection.plane).toEqual(light);
  const health = frameHealthSchema.parse(inspection.health);
  expect(health.clippedFraction).toBe(0);
  expect(health.peakFraction).toBeCloseTo(3000 / 4031, 1);
  expect(Math.abs(health.blackCount - SENSOR.blackCount)).toBeLessThan(3);
  // Read noise of 8 electrons at 4 electrons a count, rounding, and a little light.
  expect(health.noiseCounts).toBeGreaterThan(1.8);
  expect(health.noiseCounts).toBeLessThan(3);
  const { widthPx, heightPx, bytes } = inspection.thumbnailTone;
  expect([widthPx, heightPx, bytes.length]).toEqual([192, 160, 192 * 160]);
  expect(bytes[80 * 192 + 91]).toBeGreaterThan(240);
  expect(bytes[0]).toBeLessThan(80);
});

test('a clipped frame says how much of it is clipped', async () => {
  const { light, inspection } = await inspect(100_000);
  const clipped = light.filter((count) => count >= 4095).length / light.length;
  expect(inspection.health.clippedFraction).toBeCloseTo(clipped, 6);
  expect(clipped).toBeGreaterThan(0.005);
  expect(inspection.health.peakFraction).toBe(1);
});
