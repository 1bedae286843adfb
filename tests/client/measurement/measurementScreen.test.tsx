import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react-native';
import MeasurementScreen from '@/app/(lab)/measurements/[measurementId]';
import { ApiProblem } from '@/hooks/api/ApiProblem';
import { call, callText } from '@/hooks/api/call';
import { saveFile } from '@/hooks/files/saveFile';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { sampleDetail, sampleResult } from './sampleResult';

jest.mock('expo-router', () => ({
  useLocalSearchParams: () => ({ measurementId: '00000000-0000-4000-8000-000000000101' }),
  router: { push: jest.fn(), navigate: jest.fn() },
}));
jest.mock('@/hooks/api/call', () => ({ call: jest.fn(), callText: jest.fn(), callBytes: jest.fn() }));
jest.mock('@/hooks/files/saveFile', () => ({ saveFile: jest.fn(async () => undefined) }));
const mockRole = jest.fn(() => 'technician');
jest.mock('@/hooks/session/SessionProvider', () => ({ useRole: () => mockRole() }));

const answers = jest.mocked(call);

function show(answer: MeasurementDetail | ApiProblem | null): void {
  answers.mockImplementation(async (endpoint) => {
    if (!endpoint.path.startsWith('/measurements/')) throw new ApiProblem('not-found', 'None.', null, {}, 404);
    if (answer === null) return new Promise(() => undefined);
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
      <MeasurementScreen />
    </QueryClientProvider>,
  );
}

let shown: QueryClient | undefined;
// What is kept of the pictures has a time of its own, on which the process would wait.
afterEach(() => {
  cleanup();
  shown?.clear();
});

describe('measurement screen', () => {
  beforeEach(() => mockRole.mockReturnValue('technician'));

  it('keeps the place while the measurement is read', () => {
    show(null);
    expect(screen.getByRole('heading', { name: 'Measurement' })).toBeTruthy();
    expect(screen.queryByText('Look at the frame')).toBeNull();
  });

  it('says what could not be read, the number to quote, and tries again', async () => {
    show(new ApiProblem('internal', 'The server had a fault.', 'F-00123', {}, 500));
    expect(await screen.findByText('Could not read the measurement.')).toBeTruthy();
    expect(screen.getByText('Number to quote: F-00123')).toBeTruthy();
    const before = answers.mock.calls.length;
    fireEvent.press(screen.getByText('Try again'));
    await waitFor(() => expect(answers.mock.calls.length).toBe(before + 1));
  });

  it('shows the size first, then its tolerance, flags, ways, budget and what it rests on', async () => {
    show(sampleDetail());
    expect((await screen.findAllByText('100.37')).length).toBeGreaterThan(0);
    for (const text of [
      'Inside the tolerance by 0.63\u202fµm',
      'No flat frame',
      'All three lie within the stated uncertainty.',
      'Ring table',
      'Distance makes 85\u202f% of it. More frames change nothing here.',
      'Bench 2, revision 7',
      '1.02, expected 1.00',
    ]) {
      expect(screen.getByText(text)).toBeTruthy();
    }
  });

  it('gives no number for a refusal, but the reason and what to do', async () => {
    const message = 'A second, weaker pattern lies 1.9 mm from the first.';
    show(
      sampleDetail({
        state: 'refused',
        reason: 'two-patterns',
        message,
        sizeUm: null,
        result: { id: 'a', status: 'refused', reason: 'two-patterns', message, engine: '1.0.0', timingsMs: null },
      }),
    );
    expect(await screen.findByText('Two patterns')).toBeTruthy();
    expect(screen.getByText(message)).toBeTruthy();
    expect(screen.getByText('Block stray light, then take the frames again.')).toBeTruthy();
    expect(screen.getByText('Take again')).toBeTruthy();
    expect(screen.queryByText('Uncertainty by cause')).toBeNull();
  });

  it('says what is being done while it runs', async () => {
    show(sampleDetail({ state: 'measuring', stage: 'centre', result: null, sizeUm: null, finishedAt: null }));
    expect(await screen.findByText('Measuring')).toBeTruthy();
    expect(screen.getByText('taking the dark off, done')).toBeTruthy();
    expect(screen.getByText('finding the centre')).toBeTruthy();
  });

  it('measures again with other settings', async () => {
    show(sampleDetail());
    fireEvent.press(await screen.findByText('Again'));
    fireEvent.press(screen.getByRole('checkbox', { name: 'Take the darks off' }));
    const buttons = screen.getAllByText('Measure again');
    fireEvent.press(buttons[buttons.length - 1]!);
    await waitFor(() =>
      expect(answers.mock.calls.find(([endpoint]) => endpoint.path.endsWith('/again'))?.[1]).toMatchObject({
        body: { useDarks: false, pattern: 'pinhole' },
      }),
    );
  });

  it('offers a reviewer no run of their own', async () => {
    mockRole.mockReturnValue('reviewer');
    show(sampleDetail());
    expect(await screen.findByText('Look at the frame')).toBeTruthy();
    expect(screen.queryByText('Again')).toBeNull();
  });

  it('saves the ring table under the name of lot, piece and run', async () => {
    jest.mocked(callText).mockResolvedValue('order,radius\n');
    show(sampleDetail({ result: sampleResult() }));
    fireEvent.press(await screen.findByText('Ring table, CSV'));
    await waitFor(() =>
      expect(saveFile).toHaveBeenCalledWith('L-0417-PO-100-07-rings-00000000.csv', 'order,radius\n', 'text/csv'),
    );
  });
});
