import { useSyncExternalStore } from 'react';
import type { LinkState } from './eventLink';

let state: LinkState = 'idle';
const listeners = new Set<() => void>();
const subscribe = (listener: () => void) => {
  listeners.add(listener);
  return () => listeners.delete(listener);
};

/** Says how the event stream stands; only the link itself calls this. */
export function setStreamState(next: LinkState): void {
  state = next;
  listeners.forEach((listener) => listener());
}

/** Whether what moves has to be asked for instead of being told. */
export function useStreamIsDown(): boolean {
  return useSyncExternalStore(
    subscribe,
    () => state !== 'live',
    () => true,
  );
}

/** How often to ask again for something that is moving, ms: now and then even under a stream, in case an event was lost. */
export const pollEvery = (streamIsDown: boolean): number => (streamIsDown ? 2500 : 15_000);
