import type { FrameKind } from '@/shared/contracts/captures';
import { checkSource } from './checkSource';
import type { FrameSource } from './frameSource';
import { guessKind } from './guessKind';
import { hashSource } from './hashSource';
import { isHeld, isKindOpen, isWorking, type UploadItem } from './uploadItem';
import { UploadProblem } from './uploadProblem';

/** How the queue reaches the laboratory. All throw `UploadProblem` when they cannot, or the signal's reason. */
export interface UploadPort {
  /** Puts files the laboratory already holds into the capture; answers with the hashes still to be sent. */
  placeKnown(files: { name: string; kind: FrameKind; sha256: string }[]): Promise<string[]>;
  send(
    item: { source: FrameSource; name: string; kind: FrameKind; sha256: string },
    options: { signal: AbortSignal; onProgress: (sentBytes: number) => void },
  ): Promise<void>;
  /** Measures what has no run, or a run with fewer darks than there are now. */
  measure(): Promise<void>;
}

export interface UploadQueueOptions {
  port: UploadPort;
  /** Called when a file has arrived, so that lists are read again. */
  onHeld: () => void;
  /** Called on every change with all files, so that an unfinished batch can be remembered. */
  onChange?: (items: readonly UploadItem[]) => void;
  parallel?: number;
  check?: (source: FrameSource) => Promise<string | null>;
  hash?: typeof hashSource;
  now?: () => number;
  /** Waits that follow one another after a broken attempt, milliseconds; the last one repeats. */
  waitsMs?: readonly number[];
  /** Attempts that a fault of the server may break off before a person has to ask again. */
  busyAttempts?: number;
}

export interface UploadQueue {
  subscribe(listener: () => void): () => void;
  items(): readonly UploadItem[];
  add(sources: readonly FrameSource[], kind?: FrameKind): void;
  setKind(id: string, kind: FrameKind): void;
  cancel(id: string): void;
  cancelAll(): void;
  retry(id: string): void;
  /** Takes up at once what waits for the network; called when the network is back. */
  wake(): void;
  /** Takes a file that has come to rest off the list. */
  dismiss(id: string): void;
}

const ORDER: readonly FrameKind[] = ['dark', 'flat', 'light'];
const byOrder = (a: UploadItem, b: UploadItem) => ORDER.indexOf(a.kind) - ORDER.indexOf(b.kind);
const DEFAULT_WAITS_MS = [1000, 2000, 4000, 8000, 15_000, 30_000];

let lastId = 0;

/**
 * Sends files to a capture: checks, hashes and asks what is stored already, then sends two or three at a time, darks
 * and flats before lights, so that each light meets its darks. Pure of the platform: what it needs comes by `options`.
 */
export function uploadQueue(options: UploadQueueOptions): UploadQueue {
  const { port, parallel = 3, check = checkSource, hash = hashSource, now = Date.now, busyAttempts = 5 } = options;
  const waitsMs = options.waitsMs ?? DEFAULT_WAITS_MS;
  const listeners = new Set<() => void>();
  const controllers = new Map<string, AbortController>();
  let items: readonly UploadItem[] = [];
  let asking = false;
  let wakeTimer: ReturnType<typeof setTimeout> | null = null;
  let brokenInARow = 0;
  /** Set once darks or flats of this batch have arrived: lights measured before them are measured again at its end. */
  let measureOwed = false;
  let measuring = false;

  const find = (id: string) => items.find((item) => item.id === id);
  function publish(next: readonly UploadItem[]): void {
    items = next;
    options.onChange?.(items);
    listeners.forEach((listener) => listener());
  }
  function patch(id: string, change: Partial<UploadItem>): void {
    if (find(id)) publish(items.map((item) => (item.id === id ? { ...item, ...change } : item)));
  }
  function held(id: string, state: 'stored' | 'known', problem: string | null = null): void {
    const item = find(id);
    if (item && item.kind !== 'light') measureOwed = true;
    patch(id, { state, part: 1, secondsLeft: null, problem });
    options.onHeld();
  }

  /** A file that was to go in place of its twins does not go: they go themselves. */
  function freeTwins(ids: readonly string[]): void {
    const isFreed = (item: UploadItem) => item.twinOf !== null && ids.includes(item.twinOf) && item.state === 'known';
    if (items.some(isFreed)) {
      publish(
        items.map((item) =>
          isFreed(item) ? { ...item, state: 'hashed', twinOf: null, problem: null, part: 0 } : item,
        ),
      );
    }
  }

  function broken(id: string, cause: unknown, back: 'hashed' | 'ready'): void {
    const item = find(id);
    if (!item || item.state === 'cancelled') return;
    const attempts = item.attempts + 1;
    const problem =
      cause instanceof UploadProblem
        ? cause
        : new UploadProblem('refused', 'The file cannot be read. Choose it again.');
    const goesOn = problem.kind === 'network' || (problem.kind === 'busy' && attempts < busyAttempts);
    if (!goesOn) {
      patch(id, { state: 'failed', problem: problem.message, attempts, part: 0, secondsLeft: null });
      freeTwins([id]);
      return;
    }
    brokenInARow += 1;
    patch(id, {
      state: problem.kind === 'network' ? 'offline' : back,
      problem: problem.message,
      attempts,
      part: 0,
      secondsLeft: null,
    });
    sleep();
  }
  function sleep(): void {
    if (wakeTimer) return;
    const wait = waitsMs[Math.min(brokenInARow - 1, waitsMs.length - 1)] ?? 1000;
    wakeTimer = setTimeout(() => wake(), wait);
  }
  function wake(): void {
    if (wakeTimer) clearTimeout(wakeTimer);
    wakeTimer = null;
    if (items.some((item) => item.state === 'offline')) {
      publish(
        items.map((item) =>
          item.state === 'offline' ? { ...item, state: item.sha256 === null ? 'hashing' : 'hashed' } : item,
        ),
      );
    }
    run();
  }

  async function prepare(id: string): Promise<void> {
    const item = find(id);
    if (!item) return;
    const controller = new AbortController();
    controllers.set(id, controller);
    try {
      const unfit = await check(item.source);
      if (controller.signal.aborted) return;
      if (unfit) {
        patch(id, { state: 'unfit', problem: unfit });
        return;
      }
      patch(id, { state: 'hashing', part: 0 });
      const sha256 = await hash(item.source, { signal: controller.signal, onProgress: (part) => patch(id, { part }) });
      if (controller.signal.aborted) return;
      const twin = items.find(
        (other) =>
          other.id !== id && other.sha256 === sha256 && other.state !== 'failed' && other.state !== 'cancelled',
      );
      patch(id, { sha256, part: 0 });
      if (twin) {
        patch(id, { twinOf: twin.twinOf ?? twin.id });
        held(id, 'known', `The same bytes as ${twin.name}, sent once.`);
      } else patch(id, { state: 'hashed' });
    } catch (cause) {
      if (!controller.signal.aborted) broken(id, cause, 'hashed');
    } finally {
      controllers.delete(id);
    }
  }

  async function ask(): Promise<void> {
    const asked = items.filter((item) => item.state === 'hashed' && item.sha256 !== null);
    if (asked.length === 0) return;
    asking = true;
    try {
      const missing = new Set(
        await port.placeKnown(asked.map(({ name, kind, sha256 }) => ({ name, kind, sha256: sha256 ?? '' }))),
      );
      brokenInARow = 0;
      for (const { id, sha256 } of asked) {
        if (find(id)?.state !== 'hashed') continue;
        if (sha256 !== null && missing.has(sha256)) patch(id, { state: 'ready', problem: null });
        else held(id, 'known', 'Stored before. It was not sent again.');
      }
    } catch (cause) {
      for (const { id } of asked) if (find(id)?.state === 'hashed') broken(id, cause, 'hashed');
    } finally {
      asking = false;
    }
  }

  async function send(item: UploadItem): Promise<void> {
    const controller = new AbortController();
    controllers.set(item.id, controller);
    const begun = now();
    patch(item.id, { state: 'sending', part: 0, secondsLeft: null, problem: null });
    try {
      await port.send(
        { source: item.source, name: item.name, kind: item.kind, sha256: item.sha256 ?? '' },
        {
          signal: controller.signal,
          onProgress: (sentBytes) => {
            if (find(item.id)?.state !== 'sending') return;
            const part = Math.min(1, sentBytes / item.source.sizeBytes);
            const elapsed = (now() - begun) / 1000;
            const secondsLeft = elapsed > 0.5 && part > 0.02 ? (elapsed / part) * (1 - part) : null;
            patch(item.id, { part, secondsLeft });
          },
        },
      );
      if (controller.signal.aborted) return;
      brokenInARow = 0;
      held(item.id, 'stored');
    } catch (cause) {
      if (!controller.signal.aborted) broken(item.id, cause, 'ready');
    } finally {
      controllers.delete(item.id);
    }
  }

  async function settle(): Promise<void> {
    if (!measureOwed || measuring || items.some(isWorking)) return;
    measuring = true;
    try {
      await port.measure();
      measureOwed = false;
      options.onHeld();
    } catch (cause) {
      if (cause instanceof UploadProblem && cause.kind !== 'refused') {
        brokenInARow += 1;
        sleep();
      } else measureOwed = false;
    } finally {
      measuring = false;
    }
  }

  /** Starts whatever can be started now. Safe to call at any time. */
  function run(): void {
    const preparing = [...controllers.keys()].some((id) => ['checking', 'hashing'].includes(find(id)?.state ?? ''));
    if (!preparing) {
      const next = items
        .filter((i) => (i.state === 'checking' || i.state === 'hashing') && !controllers.has(i.id))
        .sort(byOrder)[0];
      if (next) void prepare(next.id).then(run);
    }
    if (wakeTimer === null) {
      if (!asking && items.some((item) => item.state === 'hashed')) void ask().then(run);
      const firstOpen = ORDER.find((kind) => items.some((item) => item.kind === kind && isWorking(item)));
      // Flats may go with darks; a light waits until no dark or flat is under way.
      const mayGo = (item: UploadItem) => item.kind !== 'light' || firstOpen === 'light';
      const busy = items.filter((item) => item.state === 'sending').length;
      items
        .filter((item) => item.state === 'ready' && !controllers.has(item.id) && mayGo(item))
        .sort(byOrder)
        .slice(0, Math.max(0, parallel - busy))
        .forEach((item) => void send(item).then(run));
      void settle();
    }
  }

  return {
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    items: () => items,
    add(sources, kind) {
      const added = sources.map((source): UploadItem => {
        lastId += 1;
        return {
          id: `upload-${lastId}`,
          source,
          name: source.name,
          kind: kind ?? guessKind(source.name),
          state: 'checking',
          sha256: null,
          part: 0,
          secondsLeft: null,
          problem: null,
          twinOf: null,
          attempts: 0,
        };
      });
      publish([...items, ...added]);
      run();
    },
    setKind(id, kind) {
      const item = find(id);
      if (!item || !isKindOpen(item)) return;
      patch(id, { kind });
      run();
    },
    cancel(id) {
      const item = find(id);
      if (!item || !isWorking(item)) return;
      patch(id, { state: 'cancelled', part: 0, secondsLeft: null, problem: null });
      controllers.get(id)?.abort();
      freeTwins([id]);
      run();
    },
    cancelAll() {
      const going = items.filter(isWorking).map((item) => item.id);
      publish(
        items.map((item) =>
          isWorking(item) ? { ...item, state: 'cancelled', part: 0, secondsLeft: null, problem: null } : item,
        ),
      );
      going.forEach((id) => controllers.get(id)?.abort());
      run();
    },
    retry(id) {
      const item = find(id);
      if (!item || (item.state !== 'failed' && item.state !== 'cancelled')) return;
      patch(id, { state: item.sha256 === null ? 'checking' : 'hashed', problem: null, attempts: 0 });
      wake();
    },
    wake,
    dismiss(id) {
      const item = find(id);
      if (item && !isWorking(item)) publish(items.filter((other) => other.id !== id));
    },
  };
}

/** Files that wait for the network. */
export const offlineCount = (items: readonly UploadItem[]): number => items.filter((i) => i.state === 'offline').length;
/** Files that the laboratory does not hold yet and that nobody has taken back. */
export const unheld = (items: readonly UploadItem[]): UploadItem[] =>
  items.filter((item) => !isHeld(item) && item.state !== 'unfit' && item.state !== 'cancelled');
