import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { measureResultSchema } from '../../../shared/contracts/measureResult';
import { simulatePinhole } from '../../../server/simulator/simulatePinhole';
import { BENCH, graymap, SENSOR } from '../analysis/simulatedCase';

const folder = mkdtempSync(join(tmpdir(), 'ringwright-measure-'));
const launcher = resolve(__dirname, '../../../server/scripts/measure.js');
const bench = { wavelengthNm: 632.8, distanceMm: 100, pixelPitchUm: 5.2, pattern: 'pinhole', camera: { bitDepth: 12 } };

function command(...flags: string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, [launcher, ...flags], {
    cwd: folder,
    encoding: 'utf8',
  });
  const lines = stdout.split('\n').filter((line) => line !== '');
  return { status, stderr, results: lines.map((line) => measureResultSchema.parse(JSON.parse(line))) };
}

beforeAll(() => {
  const { light } = simulatePinhole(BENCH);
  writeFileSync(join(folder, 'good.pgm'), graymap(light, SENSOR.widthPx, SENSOR.heightPx, 4095));
  writeFileSync(join(folder, 'broken.tif'), 'II*\0 this is cut off');
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

test('a manifest gives one line a case, in order; what is broken fails that case alone', () => {
  const cases = [
    { ...bench, id: 'one', frame: 'good.pgm' },
    { ...bench, id: 'broken', frame: 'broken.tif' },
    { ...bench, id: 'missing', frame: 'nowhere.tif' },
    { ...bench, id: 'no-distance', frame: 'good.pgm', distanceMm: undefined },
    { ...bench, id: 'slit', frame: 'good.pgm', pattern: 'slit' },
    { id: 7 },
    { ...bench, id: 'two', frame: 'good.pgm', nominalSizeUm: 20 },
  ];
  writeFileSync(join(folder, 'cases.json'), JSON.stringify({ cases }));
  const { status, results } = command('--manifest', 'cases.json');
  expect(status).toBe(0);
  expect(results.map(({ id }) => id)).toEqual(['one', 'broken', 'missing', 'no-distance', 'slit', 'case-6', 'two']);
  expect(results.map((r) => (r.status === 'measured' ? r.status : r.reason))).toEqual([
    'measured',
    'unreadable',
    'unreadable',
    'bad-case',
    'wrong-pattern',
    'bad-case',
    'measured',
  ]);
  const [one, , missing, noDistance, , , two] = results as Record<string, unknown>[];
  expect(missing.message).toContain('nowhere.tif');
  expect(noDistance.message).toContain('distanceMm');
  expect(two.sizeUm).toBe(one.sizeUm);
  const { expandedUncertaintyUm, coverageFactor, standardUncertaintyUm } = one as Record<string, number>;
  expect(expandedUncertaintyUm).toBeCloseTo(coverageFactor * standardUncertaintyUm, 9);
  expect(Math.abs((one.sizeUm as number) - BENCH.diameterUm)).toBeLessThan(expandedUncertaintyUm);
});

test('a single case by flags', () => {
  const { status, results } = command(
    '--frame',
    'good.pgm',
    '--pattern',
    'pinhole',
    '--wavelength-nm',
    '632.8',
    '--distance-mm',
    '100',
    '--pixel-pitch-um',
    '5.2',
    '--camera.bit-depth',
    '12',
    '--uncertainty.distance-mm',
    '0.05',
  );
  expect(status).toBe(0);
  expect(results).toHaveLength(1);
  expect(results[0]).toMatchObject({ status: 'measured', pattern: 'pinhole' });
  expect(JSON.stringify(results[0])).toContain('"source":"distance"');
});

test.each([
  ['nothing', []],
  ['an unknown flag', ['--frmae', 'x.tif']],
  ['a number that is none', ['--frame', 'good.pgm', '--distance-mm', 'far']],
  ['a manifest that is not there', ['--manifest', 'nowhere.json']],
])('wrong use ends with status 2 and says how: %s', (_, flags) => {
  const { status, stderr, results } = command(...flags);
  expect(status).toBe(2);
  expect(results).toEqual([]);
  expect(stderr).toContain('--manifest cases.json');
});
