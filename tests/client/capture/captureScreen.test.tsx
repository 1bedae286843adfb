import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react-native';
import CaptureScreen from '@/app/(lab)/captures/[captureId]';
import { ApiProblem } from '@/hooks/api/ApiProblem';
import { call } from '@/hooks/api/call';
import { applyProgress } from '@/hooks/events/applyProgress';
import type { CaptureDetail } from '@/shared/contracts/captures';
import { sampleCapture, sampleFrame, sampleMeasurement } from './sampleCapture';

jest.mock('expo-router', () => ({
  useLocalSearchParams: () => ({ captureId: '00000000-0000-4000-8000-000000000001' }),
  router: { push: jest.fn(), navigate: jest.fn() },
}));
jest.mock('@/hooks/api/call', () => ({
  call: jest.fn(),
  callBytes: jest.fn(() => Promise.reject(new Error('no picture'))),
  callText: jest.fn(),
}));
const mockRole = jest.fn(() => 'technician');
jest.mock('@/hooks/session/SessionProvider', () => ({ useRole: () => mockRole() }));

const answers = jest.mocked(call);

let shown: QueryClient | undefined;
// What is kept of the pictures has a time of its own, on which the process would wait.
afterEach(() => {
  cleanup();
  shown?.clear();
});

function show(answer: CaptureDetail | ApiProblem): QueryClient {
  answers.mockReset();
  answers.mockImplementation(async (endpoint) => {
    if (endpoint.path !== '/captures/:captureId') return {} as never;
    if (answer instanceof ApiProblem) throw answer;
    return answer as never;
  });
  const client = new QueryClient({
    defaultOptions: {
      queries: { retry: false, gcTime: Infinity },
      mutations: { gcTime: Infinity },
    },
  });
  shown = client;
  render(
    <QueryClientProvider client={client}>
      <CaptureScreen />
    </QueryClientProvider>,
  );
  return client;
}

const mean = { count: 2, sizeUm: 100.37, standardUncertaintyUm: 0.055, expandedUncertaintyUm: 0.11, coverageFactor: 2 };

describe('capture screen', () => {
  beforeEach(() => mockRole.mockReturnValue('technician'));

  it('says what to do while there is nothing, with the cautions', async () => {
    show(sampleCapture([]));
    expect(await screen.findByText(/No frames yet. Snap one/)).toBeTruthy();
    expect(screen.getByText(/laser safety officer/)).toBeTruthy();
    expect(screen.getByText(/None yet. Close the shutter/)).toBeTruthy();
  });

  it('says what could not be read', async () => {
    show(new ApiProblem('not-found', 'There is no such capture.', null, {}, 404));
    expect(await screen.findByText('Could not read the capture.')).toBeTruthy();
    expect(screen.getByText('There is no such capture.')).toBeTruthy();
  });

  it('shows the mean so far, each size, and what needs a person', async () => {
    const refused = sampleMeasurement(3, {
      state: 'refused',
      reason: 'no-pattern',
      message: 'No rings.',
      sizeUm: null,
    });
    show(
      sampleCapture(
        [
          sampleFrame(1),
          sampleFrame(2, { measurement: sampleMeasurement(2, { sizeUm: 100.39 }) }),
          sampleFrame(3, { measurement: refused }),
          sampleFrame(4, { kind: 'dark', measurement: null }),
        ],
        { mean },
      ),
    );
    expect((await screen.findAllByText('100.37')).length).toBe(2);
    expect(screen.getByText('100.39')).toBeTruthy();
    expect(screen.getByLabelText('2 of 3 sizes, 1 refused')).toBeTruthy();
    expect(screen.getByText('0417-07-3.tif: no pattern')).toBeTruthy();
    fireEvent.press(screen.getByText('Leave out'));
    await waitFor(() =>
      expect(answers.mock.calls.find(([endpoint]) => endpoint.method === 'patch')?.[1]).toMatchObject({
        body: { leftOut: true },
      }),
    );
  });

  it('offers to measure again when darks came later', async () => {
    show(sampleCapture([sampleFrame(1)], { outdatedCount: 1, darkCount: 5, mean }));
    fireEvent.press(await screen.findByText('Measure 1 again'));
    await waitFor(() =>
      expect(answers.mock.calls.some(([endpoint]) => endpoint.path === '/captures/:captureId/measurements')).toBe(true),
    );
  });

  it('follows the stage of a running measurement without being read again', async () => {
    const running = sampleMeasurement(1, { state: 'waiting', sizeUm: null, finishedAt: null });
    const client = show(sampleCapture([sampleFrame(1, { measurement: running })]));
    expect(await screen.findByText('waits its turn')).toBeTruthy();
    const reads = answers.mock.calls.length;
    act(() =>
      applyProgress(client).take({
        type: 'measurement',
        captureId: running.captureId,
        captureFrameId: running.captureFrameId,
        measurementId: running.id,
        state: 'measuring',
        stage: 'fit',
      }),
    );
    expect(await screen.findByText('fitting the size')).toBeTruthy();
    expect(answers.mock.calls).toHaveLength(reads);
  });

  it('gives a reviewer nothing to change', async () => {
    mockRole.mockReturnValue('reviewer');
    show(sampleCapture([sampleFrame(1, { state: 'unusable', problem: 'Cut short.', measurement: null })]));
    expect(await screen.findByText('0417-07-1.tif cannot be used')).toBeTruthy();
    expect(screen.queryByText('Leave out')).toBeNull();
    expect(screen.queryByText('Snap')).toBeNull();
  });
});
