import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { measureCaseSchema } from '../../shared/contracts/measureCase';
import { measureResultSchema, warningFlags, type Flag } from '../../shared/contracts/measureResult';
import { measure } from '../../server/analysis/measure';

interface ReferenceFrame {
  case: { id: string; frame: string; darks?: string[] };
  truth: {
    expect: 'measured' | 'refused';
    sizeUm?: number;
    centrePx?: { x: number; y: number };
    tolerancePercent?: number;
    clean?: boolean;
  };
}

const { frames } = JSON.parse(readFileSync(join(__dirname, 'truth.json'), 'utf8')) as { frames: ReferenceFrame[] };
const bytes = (name: string) => readFileSync(join(__dirname, 'frames', name));
const isWarning = (flag: Flag) => (warningFlags as readonly Flag[]).includes(flag);

async function run(frame: ReferenceFrame) {
  const measureCase = measureCaseSchema.parse(frame.case);
  const output = await measure(measureCase, {
    frames: [bytes(frame.case.frame)],
    darks: (frame.case.darks ?? []).map(bytes),
    flats: [],
  });
  expect(measureResultSchema.parse(output.result)).toEqual(output.result);
  return output;
}

describe('frames of known pinholes', () => {
  const measured = frames.filter(({ truth }) => truth.expect === 'measured');

  test.each(measured.map((frame) => [frame.case.id, frame] as const))(
    '%s is measured within its tolerance and its stated uncertainty',
    async (_, frame) => {
      const { result, radialProfile, misfit } = await run(frame);
      if (result.status !== 'measured') throw new Error(`It was ${result.status}: ${JSON.stringify(result)}`);
      const { sizeUm = NaN, centrePx = { x: NaN, y: NaN }, tolerancePercent = NaN, clean } = frame.truth;
      const size = result.sizeUm ?? NaN;
      const standard = result.standardUncertaintyUm ?? NaN;
      expect(Math.abs(100 * (size / sizeUm - 1))).toBeLessThan(tolerancePercent);
      expect(Math.abs(size - sizeUm)).toBeLessThan(3 * standard);
      // An uncertainty ten times the tolerance would hold everything and say nothing.
      expect((100 * standard) / sizeUm).toBeLessThan(10 * tolerancePercent);
      expect(
        Math.hypot((result.centrePx?.x ?? NaN) - centrePx.x, (result.centrePx?.y ?? NaN) - centrePx.y),
      ).toBeLessThan(0.3);
      expect(result.expandedUncertaintyUm).toBeCloseTo((result.coverageFactor ?? NaN) * standard, 9);
      expect(Math.hypot(...result.budget.map((line) => line.contributionUm))).toBeCloseTo(standard, 9);
      if (clean) expect(result.flags.filter(isWarning)).toEqual([]);
      for (const ring of result.rings) {
        expect(Math.abs(ring.radiusMm - ring.predictedMm)).toBeLessThan(5 * ring.uncertaintyMm + 2e-4);
      }
      expect(result.rings.filter((ring) => ring.kind === 'dark').length).toBeGreaterThan(0);
      const { sizeUm: second, standardUncertaintyUm: secondUncertainty, reason } = result.secondOpinion;
      if (second === null) expect(reason).not.toBeNull();
      else expect(Math.abs(second - sizeUm)).toBeLessThan(3.5 * (secondUncertainty ?? NaN));
      expect(radialProfile?.radiusMm.length).toBe(radialProfile?.modelCounts.length);
      expect(misfit?.bytes.length).toBe((misfit?.widthPx ?? 0) * (misfit?.heightPx ?? 0));
    },
  );

  test('the size on record does not steer the result', async () => {
    const frame = measured.find(({ case: { id } }) => id === 'clipped-core') as ReferenceFrame;
    const first = await run(frame);
    const second = await run({ ...frame, case: { ...frame.case, nominalSizeUm: 12 } as ReferenceFrame['case'] });
    expect(first.result).toMatchObject({ sizeUm: (second.result as { sizeUm: number }).sizeUm });
  });

  test('the tilt of the sensor is found and taken out', async () => {
    const frame = measured.find(({ case: { id } }) => id === 'tilted-sensor') as ReferenceFrame;
    const { result } = await run(frame);
    expect(result).toMatchObject({ flags: expect.arrayContaining(['tilted-sensor']) as unknown });
  });
});

describe('frames without the pattern of one pinhole', () => {
  const refused = frames.filter(({ truth }) => truth.expect === 'refused');
  const reasons: Record<string, string> = {
    'noise-only': 'no-pattern',
    speckle: 'no-pattern',
    slit: 'wrong-pattern',
    'bare-beam': 'wrong-pattern',
    'two-patterns': 'two-patterns',
  };

  test.each(refused.map((frame) => [frame.case.id, frame] as const))('%s is refused in words', async (id, frame) => {
    const { result, radialProfile, misfit } = await run(frame);
    expect(result).toMatchObject({ status: 'refused', reason: reasons[id] });
    expect((result as { message: string }).message).toMatch(/\. [A-Z].*\.$/s);
    expect(result).not.toHaveProperty('sizeUm');
    expect(radialProfile).toBeNull();
    expect(misfit).toBeNull();
  });

  test('a dark frame is refused', async () => {
    const [frame] = frames as [ReferenceFrame];
    const { result } = await run({ ...frame, case: { ...frame.case, frame: 'pinhole-200um-dark-1.tif', darks: [] } });
    expect(result).toMatchObject({ status: 'refused', reason: 'no-pattern' });
  });
});
