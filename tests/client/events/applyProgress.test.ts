import { QueryClient } from '@tanstack/react-query';
import { applyProgress } from '@/hooks/events/applyProgress';
import { captureKeys } from '@/hooks/queries/captures';
import { measurementKeys } from '@/hooks/queries/measurements';
import type { ProgressEvent } from '@/shared/contracts/measurements';
import { sampleCapture, sampleFrame, sampleMeasurement } from '../capture/sampleCapture';

const running = sampleMeasurement(1, { state: 'measuring', stage: 'decode', sizeUm: null, finishedAt: null });
const event = (change: Partial<Extract<ProgressEvent, { type: 'measurement' }>>): ProgressEvent => ({
  type: 'measurement',
  captureId: running.captureId,
  captureFrameId: running.captureFrameId,
  measurementId: running.id,
  state: 'measuring',
  stage: 'fit',
  ...change,
});

function prepared() {
  const client = new QueryClient({ defaultOptions: { queries: { gcTime: Infinity } } });
  client.setQueryData(captureKeys.detail(running.captureId), sampleCapture([sampleFrame(1, { measurement: running })]));
  const read = jest.spyOn(client, 'invalidateQueries').mockResolvedValue();
  const keys = () => read.mock.calls.map(([filter]) => filter?.queryKey);
  return { client, keys, progress: applyProgress(client) };
}

describe('applyProgress', () => {
  beforeEach(() => jest.useFakeTimers());
  afterEach(() => jest.useRealTimers());

  it('reads the capture, the measurement and the lists once when a burst of runs has ended', () => {
    const { keys, progress } = prepared();
    progress.take(event({ state: 'measured', stage: null }));
    progress.take(event({ state: 'measured', stage: null }));
    expect(keys()).toEqual([]);
    jest.advanceTimersByTime(150);
    expect(keys()).toEqual([
      captureKeys.detail(running.captureId),
      measurementKeys.detail(running.id),
      captureKeys.lists,
      measurementKeys.lists,
      ['today'],
      ['lots'],
      ['apertures'],
    ]);
  });

  it('reads the capture again for a run or a frame it does not know', () => {
    const { keys, progress } = prepared();
    progress.take(event({ measurementId: '00000000-0000-4000-8000-000000000999', state: 'waiting', stage: null }));
    jest.advanceTimersByTime(150);
    expect(keys()).toEqual([captureKeys.detail(running.captureId)]);
    const { captureId, captureFrameId, frameId } = running;
    progress.take({ type: 'frame', captureId, captureFrameId, frameId, state: 'ready' });
    jest.advanceTimersByTime(150);
    expect(keys()).toHaveLength(2);
  });

  it('never changes a run that has ended', () => {
    const { client, progress } = prepared();
    const ended = sampleCapture([sampleFrame(1)]);
    client.setQueryData(captureKeys.detail(running.captureId), ended);
    progress.take(event({ state: 'measuring' }));
    expect(client.getQueryData(captureKeys.detail(running.captureId))).toEqual(ended);
  });
});
