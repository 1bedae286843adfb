import { eventLink } from '@/hooks/events/eventLink';

/** A stream that gives what it is handed and ends when told. */
function pipe() {
  const pieces: string[] = [];
  let wake: () => void = () => undefined;
  let ended = false;
  return {
    push(text: string) {
      pieces.push(text);
      wake();
    },
    end() {
      ended = true;
      wake();
    },
    async *read(signal: AbortSignal): AsyncGenerator<string> {
      signal.addEventListener('abort', () => wake());
      for (;;) {
        while (pieces.length > 0) yield pieces.shift()!;
        if (ended || signal.aborted) return;
        await new Promise<void>((resolve) => (wake = resolve));
      }
    },
  };
}
const settle = () => jest.advanceTimersByTimeAsync(0);

function link(open: (signal: AbortSignal) => AsyncIterable<string>) {
  const seen = { events: [] as string[], states: [] as string[], catchUps: 0 };
  const made = eventLink({
    open,
    onEvent: (event) => seen.events.push(event.data),
    onState: (state) => seen.states.push(state),
    onCatchUp: () => (seen.catchUps += 1),
    waitsMs: [100, 200],
    pollMs: 1000,
    silenceMs: 5000,
  });
  return { made, seen };
}
async function* broken(): AsyncGenerator<string> {
  throw new Error('no stream');
  yield '';
}

describe('eventLink', () => {
  beforeEach(() => jest.useFakeTimers());
  afterEach(() => jest.useRealTimers());

  it('hands on events, opens the stream again after a break and reads the lists again', async () => {
    const first = pipe();
    const second = pipe();
    const open = jest.fn().mockImplementationOnce(first.read).mockImplementationOnce(second.read);
    const { made, seen } = link(open);
    made.start();
    first.push('data: 1\n\n');
    await settle();
    expect(seen).toMatchObject({ events: ['1'], states: ['opening', 'live'], catchUps: 0 });
    first.end();
    await settle();
    expect(seen.states.at(-1)).toBe('opening');
    await jest.advanceTimersByTimeAsync(100);
    second.push(': here\n\n');
    await settle();
    expect(open).toHaveBeenCalledTimes(2);
    expect(seen).toMatchObject({ states: ['opening', 'live', 'opening', 'live'], catchUps: 1 });
    made.stop();
  });

  it('polls when the stream cannot be had, and stops polling once it can', async () => {
    const late = pipe();
    let can = false;
    const { made, seen } = link((signal) => (can ? late.read(signal) : broken()));
    made.start();
    await jest.advanceTimersByTimeAsync(100 + 200);
    expect(seen.states).toEqual(['opening', 'polling']);
    await jest.advanceTimersByTimeAsync(3000);
    expect(seen.catchUps).toBe(3);
    can = true;
    late.push(':\n');
    await jest.advanceTimersByTimeAsync(200);
    expect(seen.states.at(-1)).toBe('live');
    const before = seen.catchUps;
    await jest.advanceTimersByTimeAsync(4000);
    expect(seen.catchUps).toBe(before);
    made.stop();
  });

  it('takes long silence for a broken line', async () => {
    const silent = pipe();
    const open = jest.fn(silent.read);
    const { made } = link(open);
    made.start();
    silent.push(':\n');
    await jest.advanceTimersByTimeAsync(5000 + 100);
    expect(open).toHaveBeenCalledTimes(2);
    made.stop();
  });

  it('does nothing more once it is stopped', async () => {
    const open = jest.fn(broken);
    const { made, seen } = link(open);
    made.start();
    await settle();
    made.stop();
    await jest.advanceTimersByTimeAsync(60_000);
    expect(open).toHaveBeenCalledTimes(1);
    expect(seen.states.at(-1)).toBe('idle');
  });
});
