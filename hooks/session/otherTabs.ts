export type SessionChange = 'signed-in' | 'signed-out';

const channelName = 'ringwright-session';

function open(): BroadcastChannel | null {
  return typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(channelName);
}

/** Tells the other tabs of this browser that somebody signed in or out. */
export function announceSessionChange(change: SessionChange): void {
  const channel = open();
  channel?.postMessage(change);
  channel?.close();
}

/** Hears of changes in other tabs; returns how to stop. */
export function onSessionChangeElsewhere(listener: (change: SessionChange) => void): () => void {
  const channel = open();
  if (channel === null) return () => undefined;
  channel.onmessage = (event: MessageEvent<unknown>) => {
    if (event.data === 'signed-in' || event.data === 'signed-out') listener(event.data);
  };
  return () => channel.close();
}
