import { warningFlags, type Flag, type Stage } from '../../../shared/contracts/measureResult';
import { measureCaseSchema } from '../../../shared/contracts/measureCase';
import { measure } from '../../../server/analysis/measure';
import { simulateDark } from '../../../server/simulator/simulateDark';
import { seededRandom } from '../../../shared/metrology/seededRandom';
import { BENCH, graymap, measuredOf, measureSimulated, SENSOR } from './simulatedCase';

const warnings = (flags: Flag[]) => flags.filter((flag) => (warningFlags as readonly Flag[]).includes(flag));

describe('clean frames of simulated pinholes', () => {
  // Frames from the product's own simulator: they check the whole way from counts to size, not the optics.
  test.each([
    ['small hole', { diameterUm: 40, distanceMm: 40 }],
    ['large hole in the near field', { diameterUm: 500, distanceMm: 220 }],
    ['narrow rings', { diameterUm: 300, distanceMm: 60 }],
    ['blue light', { wavelengthNm: 450 }],
    ['little light', { peakElectrons: 900 }],
    ['stray light', { backgroundElectrons: 400, backgroundSlopeElectrons: { x: 60, y: -40 } }],
    ['a centre near the edge', { centrePx: { x: 41.7, y: 230.2 } }],
    ['a centre outside the frame', { centrePx: { x: -18.4, y: 140.9 }, peakElectrons: 60_000 }],
    ['a clipped core', { peakElectrons: 120_000 }],
    ['fourteen bits', { sensor: { ...SENSOR, bitDepth: 14, electronsPerCount: 1 } }],
  ])('%s', async (_, change) => {
    const truth = { ...BENCH, ...change };
    const result = measuredOf(await measureSimulated(change));
    expect(Math.abs(result.sizeUm - truth.diameterUm)).toBeLessThan(3 * result.standardUncertaintyUm);
    expect(result.standardUncertaintyUm / truth.diameterUm).toBeLessThan(2e-3);
    expect(Math.hypot(result.centrePx.x - truth.centrePx.x, result.centrePx.y - truth.centrePx.y)).toBeLessThan(0.15);
    expect(warnings(result.flags)).toEqual([]);
  });

  test('errors of repeated frames are as large as the fit says', async () => {
    let sum = 0;
    const runs = 12;
    for (let seed = 1; seed <= runs; seed++) {
      const result = measuredOf(
        await measureSimulated({ seed, centrePx: { x: 160 + (seed % 7) * 3.3, y: 140 + (seed % 5) * 4.1 } }),
      );
      sum += ((result.sizeUm - BENCH.diameterUm) / result.standardUncertaintyUm) ** 2;
    }
    // The budget also holds terms that these frames do not have (smooth response, tilt, model): under one, not far under.
    expect(Math.sqrt(sum / runs)).toBeGreaterThan(0.15);
    expect(Math.sqrt(sum / runs)).toBeLessThan(1.3);
  });

  test('the same case gives the same numbers', async () => {
    const [first, second] = [measuredOf(await measureSimulated({})), measuredOf(await measureSimulated({}))];
    expect(second).toEqual({ ...first, timingsMs: second.timingsMs });
  });
});

describe('what the engine is told', () => {
  test('stated uncertainties of the bench enter the budget with their sensitivities', async () => {
    const plain = measuredOf(await measureSimulated({}));
    const stated = measuredOf(
      await measureSimulated({}, { uncertainty: { distanceMm: 0.05, wavelengthNm: 0.01, pixelPitchUm: 0.001 } }),
    );
    const line = (source: string) => stated.budget.find((b) => b.source === source);
    expect(line('distance')?.contributionUm).toBeCloseTo((stated.sizeUm * 0.05) / 100, 6);
    expect(line('wavelength')?.contributionUm).toBeCloseTo((stated.sizeUm * 0.01) / 632.8, 6);
    expect(line('pixel-pitch')?.contributionUm).toBeCloseTo((stated.sizeUm * 0.001) / 5.2, 6);
    expect(plain.budget.some((b) => b.source === 'distance')).toBe(false);
    expect(stated.sizeUm).toBe(plain.sizeUm);
    expect(stated.standardUncertaintyUm).toBeGreaterThan(plain.standardUncertaintyUm);
  });

  test('a cover glass shortens the path by t(1 − 1/n)', async () => {
    const plain = measuredOf(await measureSimulated({}));
    const glass = measuredOf(
      await measureSimulated({}, { camera: { bitDepth: 12, coverGlassMm: 1, coverGlassIndex: 1.5 } }),
    );
    // Computed: a distance shorter by 1/3 mm of 100 mm, and so a size smaller by as much, near field aside.
    expect(glass.sizeUm / plain.sizeUm).toBeCloseTo(1 - 1 / 300, 4);
  });

  test('a Gaussian beam that is stated is used; one that is not is found and told', async () => {
    const beam = { kind: 'gaussian', beamRadiusUm: 180 } as const;
    const stated = measuredOf(await measureSimulated({ illumination: beam }, { illumination: beam }));
    expect(warnings(stated.flags)).toEqual([]);
    expect(Math.abs(stated.sizeUm - 200)).toBeLessThan(3 * stated.standardUncertaintyUm);
    const unstated = measuredOf(await measureSimulated({ illumination: beam }));
    expect(unstated.flags).toContain('uneven-illumination');
    // A fit of even light would be off by several percent.
    expect(Math.abs(unstated.sizeUm / 200 - 1)).toBeLessThan(0.003);
    expect(Math.abs(unstated.sizeUm - 200)).toBeLessThan(3 * unstated.standardUncertaintyUm);
  });

  test.each([
    ['with three darks and the gain on record', 3, true],
    ['with three darks and no record', 3, false],
    ['without darks, with the gain on record', 0, true],
  ])('the misfit is as large as the noise %s', async (_, darkCount, onRecord) => {
    const { widthPx, heightPx, bitDepth, electronsPerCount, readNoiseElectrons } = SENSOR;
    const darks = Array.from({ length: darkCount }, (_none, k) =>
      graymap(simulateDark({ sensor: SENSOR, seed: 20 + k }), widthPx, heightPx, 2 ** bitDepth - 1),
    );
    const camera = onRecord ? { bitDepth, electronsPerCount, readNoiseElectrons } : { bitDepth };
    const { reducedChiSquare } = measuredOf(await measureSimulated({}, { camera }, { darks }));
    // Of some 100 000 pixels the scatter of this number is 0.5 %; the noise itself is known to a few percent.
    expect(reducedChiSquare).toBeGreaterThan(0.95);
    expect(reducedChiSquare).toBeLessThan(1.05);
  });

  test('darks take the sensor’s own pattern out', async () => {
    const sensor = {
      ...SENSOR,
      darkElectrons: 400,
      darkUnevennessElectrons: 60,
      hotFraction: 1e-3,
      hotElectrons: 4000,
    };
    const darks = [1, 2, 3, 4, 5].map((seed) =>
      graymap(simulateDark({ sensor, seed }), sensor.widthPx, sensor.heightPx, 4095),
    );
    const result = measuredOf(await measureSimulated({ sensor, peakElectrons: 9000 }, {}, { darks }));
    expect(result.flags).not.toContain('no-darks');
    expect(Math.abs(result.sizeUm - 200)).toBeLessThan(3 * result.standardUncertaintyUm);
  });

  test('stages are told in order', async () => {
    const stages: Stage[] = [];
    const measureCase = measureCaseSchema.parse({
      id: 'a',
      frame: 'f',
      pattern: 'pinhole',
      wavelengthNm: 632.8,
      distanceMm: 100,
      pixelPitchUm: 5.2,
    });
    await measure(
      measureCase,
      { frames: [graymap(new Uint16Array(64 * 64).fill(9), 64, 64)], darks: [], flats: [] },
      (stage) => stages.push(stage),
    );
    expect(stages.slice(0, 3)).toEqual(['decode', 'calibrate', 'centre']);
  });
});

describe('disturbed frames', () => {
  test.each([
    [0.01, { x: 90, y: 30 }],
    [0.03, { x: 40, y: -50 }],
    [0.08, { x: 90, y: 30 }],
  ])('a reflection of %d of the peak is taken off and told', async (height, place) => {
    const result = measuredOf(await measureSimulated({ ghost: { ...place, height } }));
    expect(result.flags).toContain('second-pattern');
    // Left in, it would move the size by up to a percent.
    expect(Math.abs(result.sizeUm / 200 - 1)).toBeLessThan(0.001);
    expect(Math.abs(result.sizeUm - 200)).toBeLessThan(3 * result.standardUncertaintyUm);
  });

  test('a sensor that stands askew by 4° is found, and the size corrected for it', async () => {
    const result = measuredOf(await measureSimulated({ tiltDeg: 4 }));
    expect(result.flags).toContain('tilted-sensor');
    // Uncorrected it would be 0.12 % small (computed: τ²/4).
    expect(Math.abs(result.sizeUm - 200)).toBeLessThan(3 * result.standardUncertaintyUm);
    expect(Math.abs(result.sizeUm / 200 - 1)).toBeLessThan(0.0008);
  });

  test('pixels of uneven response stay within the stated uncertainty', async () => {
    const sensor = { ...SENSOR, responseUnevenness: 0.02, responseDrift: 0.002 };
    const result = measuredOf(await measureSimulated({ sensor }));
    expect(warnings(result.flags)).toEqual([]);
    expect(Math.abs(result.sizeUm - 200)).toBeLessThan(3 * result.standardUncertaintyUm);
  });
});

describe('frames that cannot be measured', () => {
  const random = seededRandom(3);
  const frame = (value: (x: number, y: number) => number) => {
    const counts = new Uint16Array(300 * 240);
    for (let i = 0; i < counts.length; i++) {
      const level = value(i % 300, Math.floor(i / 300));
      counts[i] = Math.max(
        0,
        Math.min(4095, Math.round(64 + level + Math.sqrt(4 + Math.max(0, level) / 4) * random.normal())),
      );
    }
    return graymap(counts, 300, 240, 4095);
  };
  const run = async (bytes: Buffer, more: object = {}) => {
    const measureCase = measureCaseSchema.parse({
      id: 'r',
      frame: 'f',
      pattern: 'pinhole',
      wavelengthNm: 632.8,
      distanceMm: 100,
      pixelPitchUm: 5.2,
      camera: { bitDepth: 12 },
      ...more,
    });
    return (await measure(measureCase, { frames: [bytes], darks: [], flats: [] })).result;
  };

  test.each([
    ['uniform light', () => 900],
    ['nothing', () => 0],
    ['a slope of light', (x: number) => 3 * x],
  ])('%s is refused', async (_, value) => {
    expect(await run(frame(value as (x: number, y: number) => number))).toMatchObject({ status: 'refused' });
  });

  test('all black, all white and constant samples are refused', async () => {
    for (const level of [0, 77, 4095]) {
      expect(await run(graymap(new Uint16Array(300 * 240).fill(level), 300, 240, 4095))).toMatchObject({
        status: 'refused',
      });
    }
  });

  test('a square hole is no pinhole', async () => {
    const sinc = (x: number) => (x === 0 ? 1 : Math.sin(x) / x) ** 2;
    expect(await run(frame((x, y) => 3000 * sinc((x - 150) / 9) * sinc((y - 120) / 9)))).toMatchObject({
      status: 'refused',
      reason: 'wrong-pattern',
    });
  });

  test('a slit is no pinhole', async () => {
    const sinc = (x: number) => (x === 0 ? 1 : Math.sin(x) / x) ** 2;
    expect(await run(frame((x) => 3000 * sinc((x - 150) / 9)))).toMatchObject({
      status: 'refused',
      reason: 'wrong-pattern',
    });
  });

  test('a bare Gaussian beam is no pinhole', async () => {
    expect(
      await run(frame((x, y) => 3000 * Math.exp((-2 * ((x - 150) ** 2 + (y - 120) ** 2)) / 40 ** 2))),
    ).toMatchObject({ status: 'refused', reason: 'wrong-pattern' });
  });

  test('two patterns are refused', async () => {
    const { result } = await measureSimulated({ ghost: { x: 90, y: 30, height: 0.35 } });
    expect(result).toMatchObject({ status: 'refused', reason: 'two-patterns' });
  });

  test('rings that the sensor cannot tell apart are refused', async () => {
    const { result } = await measureSimulated({ diameterUm: 900, distanceMm: 12 });
    expect(result.status).toBe('refused');
  });

  test('a core alone, without its first dark ring, is refused', async () => {
    const { result } = await measureSimulated({ diameterUm: 20, distanceMm: 60, centrePx: { x: 180, y: 150 } });
    expect(result).toMatchObject({ status: 'refused' });
  });

  test('other kinds of aperture are refused honestly by this version', async () => {
    for (const pattern of ['slit', 'wire', 'edge', 'beam']) {
      const result = await run(
        frame(() => 900),
        { pattern },
      );
      expect(result).toMatchObject({ status: 'refused', reason: 'wrong-pattern' });
      expect((result as { message: string }).message).toContain('measures pinholes');
    }
  });

  test('a pinhole of unknown kind is measured as one', async () => {
    expect(measuredOf(await measureSimulated({}, { pattern: 'auto' })).pattern).toBe('pinhole');
  });

  test('files that cannot be used end as failed', async () => {
    expect(await run(Buffer.from('nonsense, not a picture'))).toMatchObject({
      status: 'failed',
      reason: 'unsupported',
    });
    const good = graymap(new Uint16Array(64 * 64), 64, 64);
    const measureCase = measureCaseSchema.parse({
      id: 'd',
      frame: 'f',
      wavelengthNm: 632.8,
      distanceMm: 100,
      pixelPitchUm: 5.2,
    });
    const output = await measure(measureCase, {
      frames: [good],
      darks: [graymap(new Uint16Array(32 * 32), 32, 32)],
      flats: [],
    });
    expect(output.result).toMatchObject({ status: 'failed', reason: 'bad-case' });
    expect((output.result as { message: string }).message).toContain('32 × 32');
  });
});
