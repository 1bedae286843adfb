export type SessionChange = 'signed-in' | 'signed-out';

/** One channel for the page: what it sends reaches the other tabs and not itself. */
let channel: BroadcastChannel | null | undefined;

function sharedChannel(): BroadcastChannel | null {
  channel ??= typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel('ringwright-session');
  return channel;
}

/** Tells the other tabs of this browser that somebody signed in or out. */
export function announceSessionChange(change: SessionChange): void {
  sharedChannel()?.postMessage(change);
}

/** Hears of changes in other tabs; returns how to stop. */
export function onSessionChangeElsewhere(listener: (change: SessionChange) => void): () => void {
  const shared = sharedChannel();
  if (shared === null) return () => undefined;
  const hear = (event: MessageEvent<unknown>) => {
    if (event.data === 'signed-in' || event.data === 'signed-out') listener(event.data);
  };
  shared.addEventListener('message', hear);
  return () => shared.removeEventListener('message', hear);
}
