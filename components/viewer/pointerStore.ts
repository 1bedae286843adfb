import { useSyncExternalStore } from 'react';
import type { Point } from './place';

/** The frame point under the pointer, kept outside React's state so that only its readout is drawn anew. */
export interface PointerStore {
  set(point: Point | null): void;
  get(): Point | null;
  subscribe(listener: () => void): () => void;
}

export function createPointerStore(): PointerStore {
  let point: Point | null = null;
  const listeners = new Set<() => void>();
  return {
    set(next) {
      if (next === point) return;
      point = next;
      for (const listener of listeners) listener();
    },
    get: () => point,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

export function usePointer(store: PointerStore): Point | null {
  return useSyncExternalStore(store.subscribe, store.get, store.get);
}
