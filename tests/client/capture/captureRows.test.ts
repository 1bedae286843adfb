import {
  attentionOf,
  calibrationRows,
  captureRows,
  lightRows,
  sendingWords,
  type SendingFile,
} from '@/components/capture/captureRows';
import { newestMeasured } from '@/components/capture/newestMeasured';
import { ringSegments } from '@/components/capture/ringSegments';
import { shortName } from '@/components/capture/shortName';
import { scatterWords } from '@/components/capture/SizesAsTheyArrive';
import { sampleFrame, sampleMeasurement } from './sampleCapture';

const file = (name: string, change: Partial<SendingFile> = {}): SendingFile => ({
  id: name,
  name,
  kind: 'light',
  state: 'sending',
  sha256: null,
  part: 0.64,
  secondsLeft: 3,
  problem: null,
  ...change,
});

describe('captureRows', () => {
  it('shows a file that has arrived once, and frames in the order in which they came', () => {
    const frames = [sampleFrame(2), sampleFrame(1), sampleFrame(3, { kind: 'dark', measurement: null })];
    const rows = captureRows(frames, [
      file('arrived.tif', { state: 'stored', sha256: frames[0]?.sha256 }),
      file('not-in-the-list-yet.tif', { state: 'stored', sha256: 'f'.repeat(64) }),
      file('dark-9.tif', { kind: 'dark' }),
    ]);
    const names = (list: typeof rows) => list.map((row) => (row.type === 'frame' ? row.frame.name : row.file.name));
    expect(names(lightRows(rows))).toEqual(['0417-07-1.tif', '0417-07-2.tif', 'not-in-the-list-yet.tif']);
    expect(names(calibrationRows(rows))).toEqual(['0417-07-3.tif', 'dark-9.tif']);
  });

  it('draws one segment for each light that counts', () => {
    const frames = [
      sampleFrame(1),
      sampleFrame(2, { measurement: sampleMeasurement(2, { state: 'measuring', stage: 'fit' }) }),
      sampleFrame(3, { measurement: sampleMeasurement(3, { state: 'refused', reason: 'no-pattern' }) }),
      sampleFrame(4, { leftOut: true }),
      sampleFrame(5, { state: 'unusable', measurement: null }),
    ];
    const files = [
      file('a'),
      file('b', { state: 'cancelled' }),
      file('c', { state: 'unfit' }),
      file('d', { state: 'ready' }),
    ];
    expect(ringSegments(lightRows(captureRows(frames, files)))).toEqual([
      { state: 'measured' },
      { state: 'measuring' },
      { state: 'refused' },
      { state: 'refused' },
      { state: 'uploading', part: 0.64 },
      { state: 'waiting' },
    ]);
  });
});

describe('attentionOf', () => {
  const clipped = { ...sampleFrame(3).health!, clippedFraction: 0.031 };

  it('asks for nothing where a frame is measured and whole, or left out', () => {
    expect(attentionOf(sampleFrame(1))).toBeNull();
    expect(attentionOf(sampleFrame(3, { health: clipped, leftOut: true }))).toBeNull();
  });

  it('names clipping, its share and the exposure to set', () => {
    const refused = sampleMeasurement(3, { state: 'refused', reason: 'clipped', message: 'too bright', sizeUm: null });
    expect(attentionOf(sampleFrame(3, { health: clipped, measurement: refused }))).toEqual({
      title: '0417-07-3.tif is clipped, 3.1\u202f%',
      detail: 'Set 3.6\u202fms, then take it again.',
    });
    expect(attentionOf(sampleFrame(3, { health: clipped, exposureMs: null }))?.detail).toBe(
      'Shorten the exposure, or attenuate before the sensor and take it again, or leave it out.',
    );
  });

  it('says why there is no size in the words of the engine, and what is wrong with a file', () => {
    const refused = sampleMeasurement(1, { state: 'refused', reason: 'two-patterns', message: 'A second pattern.' });
    expect(attentionOf(sampleFrame(1, { measurement: refused }))).toEqual({
      title: '0417-07-1.tif: two patterns',
      detail: 'A second pattern.',
    });
    expect(attentionOf(sampleFrame(1, { state: 'unusable', problem: 'Cut short.', measurement: null }))).toEqual({
      title: '0417-07-1.tif cannot be used',
      detail: 'Cut short.',
    });
  });
});

describe('words about frames', () => {
  it('says how far a file is', () => {
    expect(sendingWords(file('a'))).toBe('64\u202f%, 3 s left');
    expect(sendingWords(file('a', { part: 1 }))).toBe('sent, being stored');
    expect(sendingWords(file('a', { state: 'offline' }))).toBe('waits for the network');
    expect(sendingWords(file('a', { state: 'known' }))).toBe('stored before');
  });

  it('keeps the end of long names, where frames of a series differ', () => {
    expect(shortName('v01_airy_200um_clean_dark_2.tif', 20)).toBe('v01_air…n_dark_2.tif');
    expect(shortName('short.tif', 20)).toBe('short.tif');
  });

  it('finds the size that arrived last', () => {
    const late = sampleFrame(1, { measurement: sampleMeasurement(1, { finishedAt: '2026-03-04T09:00:00.000Z' }) });
    expect(newestMeasured([sampleFrame(2), late, sampleFrame(3)])).toBe(late);
    expect(newestMeasured([sampleFrame(2, { measurement: null })])).toBeNull();
  });

  it('says whether more frames help', () => {
    const mean = { count: 4, sizeUm: 100, standardUncertaintyUm: 0.05, expandedUncertaintyUm: 0.1, coverageFactor: 2 };
    expect(scatterWords([100.01, 99.99, 100, 100.01], mean)).toContain('will not narrow it');
    expect(scatterWords([100.2, 99.8, 100, 100.1], mean)).toContain('More frames narrow it.');
    expect(scatterWords([100], mean)).toBe('The walls are the stated uncertainty.');
  });
});
