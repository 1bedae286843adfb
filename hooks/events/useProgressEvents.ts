import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { onNetworkBack } from '@/hooks/upload/deviceEvents';
import { progressEventSchema } from '@/shared/contracts/measurements';
import { applyProgress } from './applyProgress';
import { eventLink } from './eventLink';
import { openStream } from './openStream';
import { setStreamState } from './streamState';

interface Shared {
  count: number;
  stop: () => void;
}
/** One stream for each query client, however many screens follow it. */
const shared = new Map<QueryClient, Shared>();

function follow(client: QueryClient): Shared {
  const progress = applyProgress(client);
  const link = eventLink({
    open: openStream,
    onEvent: ({ data }) => {
      let value: unknown;
      try {
        value = JSON.parse(data);
      } catch {
        return;
      }
      const event = progressEventSchema.safeParse(value);
      if (event.success) progress.take(event.data);
    },
    onState: setStreamState,
    onCatchUp: progress.readAll,
  });
  const stopListening = onNetworkBack(link.wake);
  link.start();
  return {
    count: 0,
    stop() {
      stopListening();
      link.stop();
      progress.stop();
    },
  };
}

/** Follows what the worker does for as long as the screen is shown, and carries it into the lists on it. */
export function useProgressEvents(): void {
  const client = useQueryClient();
  useEffect(() => {
    const own = shared.get(client) ?? follow(client);
    shared.set(client, own);
    own.count += 1;
    return () => {
      own.count -= 1;
      if (own.count > 0) return;
      own.stop();
      shared.delete(client);
    };
  }, [client]);
}
