import { eventStreamParser, type StreamEvent } from './eventStreamParser';

/** `live`: events arrive as they happen; `polling`: no stream is to be had, lists are read again every few seconds. */
export type LinkState = 'idle' | 'opening' | 'live' | 'polling';

export interface EventLinkOptions {
  /** Opens the stream and gives its text piece by piece; throws when it cannot be opened or breaks. */
  open: (signal: AbortSignal) => AsyncIterable<string>;
  onEvent: (event: StreamEvent) => void;
  onState: (state: LinkState) => void;
  /** Something may have been missed: read the lists again. After each break, and every few seconds while polling. */
  onCatchUp: () => void;
  waitsMs?: readonly number[];
  /** Attempts in a row that fail before polling takes over; the stream is still tried meanwhile. */
  patience?: number;
  pollMs?: number;
  /** The server says something every 15 s; silence longer than this is a broken line. */
  silenceMs?: number;
}

export interface EventLink {
  start(): void;
  stop(): void;
  /** Tries at once, when the network is back or the page is looked at again. */
  wake(): void;
}

/** Keeps a stream of events open: opens it again after a break, waits longer each time, and polls where there is none. */
export function eventLink(options: EventLinkOptions): EventLink {
  const {
    waitsMs = [500, 1000, 2000, 5000, 10_000, 20_000],
    patience = 3,
    pollMs = 4000,
    silenceMs = 40_000,
  } = options;
  let controller: AbortController | null = null;
  let state: LinkState = 'idle';
  let failures = 0;
  let waitTimer: ReturnType<typeof setTimeout> | undefined;
  let pollTimer: ReturnType<typeof setInterval> | undefined;

  function become(next: LinkState): void {
    if (state === next) return;
    state = next;
    clearInterval(pollTimer);
    if (next === 'polling') pollTimer = setInterval(options.onCatchUp, pollMs);
    options.onState(next);
  }

  async function run(own: AbortController): Promise<void> {
    let silence: ReturnType<typeof setTimeout> | undefined;
    const attempt = new AbortController();
    const end = () => attempt.abort();
    own.signal.addEventListener('abort', end);
    const listen = () => {
      clearTimeout(silence);
      silence = setTimeout(end, silenceMs);
    };
    const parser = eventStreamParser(options.onEvent);
    try {
      listen();
      for await (const text of options.open(attempt.signal)) {
        if (own.signal.aborted) break;
        listen();
        if (state !== 'live') {
          const again = failures > 0;
          failures = 0;
          become('live');
          if (again) options.onCatchUp();
        }
        parser.push(text);
      }
    } catch {
      // Whatever broke it, the answer is the same: open it again.
    } finally {
      clearTimeout(silence);
      own.signal.removeEventListener('abort', end);
    }
    if (own.signal.aborted) return;
    failures += 1;
    become(failures >= patience ? 'polling' : 'opening');
    waitTimer = setTimeout(() => void run(own), waitsMs[Math.min(failures - 1, waitsMs.length - 1)]);
  }

  function start(): void {
    if (controller) return;
    controller = new AbortController();
    failures = 0;
    become('opening');
    void run(controller);
  }
  function stop(): void {
    controller?.abort();
    controller = null;
    clearTimeout(waitTimer);
    become('idle');
  }
  return {
    start,
    stop,
    wake() {
      if (!controller || state === 'live') return;
      controller.abort();
      clearTimeout(waitTimer);
      controller = new AbortController();
      void run(controller);
    },
  };
}
