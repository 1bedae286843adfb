import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { currentSession, onSessionChange } from '@/hooks/api/accessToken';
import { captureKeys } from '@/hooks/queries/captures';
import type { FrameKind } from '@/shared/contracts/captures';
import { readBatch, writeBatch, type RememberedFile } from './batchMemory';
import { guardLeaving, onNetworkBack } from './deviceEvents';
import type { FrameSource } from './frameSource';
import { isWorking, type UploadItem } from './uploadItem';
import { uploadPort } from './uploadPort';
import { offlineCount, unheld, uploadQueue, type UploadQueue } from './uploadQueue';

interface CaptureUploads {
  queue: UploadQueue;
  /** Left unsent by an earlier visit and not chosen again. */
  earlier: RememberedFile[];
}

/** Uploads go on while other screens are shown; they end when somebody else signs in. */
const running = new Map<string, CaptureUploads>();
let readAgain: (captureId: string) => void = () => undefined;

function uploadsOf(captureId: string): CaptureUploads {
  const found = running.get(captureId);
  if (found) return found;
  const made: CaptureUploads = {
    earlier: readBatch(captureId),
    queue: uploadQueue({
      port: uploadPort(captureId),
      onHeld: () => readAgain(captureId),
      onChange: (items) => {
        made.earlier = writeBatch(captureId, made.earlier, items);
      },
    }),
  };
  running.set(captureId, made);
  return made;
}

function endAll(): void {
  running.forEach(({ queue }) => queue.cancelAll());
  running.clear();
}
let membershipId: string | null = currentSession()?.membership.id ?? null;
onSessionChange((session) => {
  if (session === null) return;
  if (membershipId !== null && session.membership.id !== membershipId) endAll();
  membershipId = session.membership.id;
});
onNetworkBack(() => running.forEach(({ queue }) => queue.wake()));
guardLeaving(() => [...running.values()].some(({ queue }) => queue.items().some(isWorking)));

export interface Uploads {
  items: readonly UploadItem[];
  /** Files that wait for the network, and with them those that would follow. */
  keptCount: number;
  /** Still on their way by themselves. */
  workingCount: number;
  /** Files of an earlier visit that did not arrive. */
  earlier: readonly RememberedFile[];
  /** `kind`: what they are; left out, the name decides. */
  add: (sources: readonly FrameSource[], kind?: FrameKind) => void;
  setKind: (id: string, kind: FrameKind) => void;
  cancel: (id: string) => void;
  cancelAll: () => void;
  retry: (id: string) => void;
  retryNow: () => void;
  dismiss: (id: string) => void;
  forgetEarlier: () => void;
}

/** The uploads of a capture: they survive leaving the screen, and what a reload broke off is remembered. */
export function useUploads(captureId: string): Uploads {
  const client = useQueryClient();
  const uploads = useMemo(() => uploadsOf(captureId), [captureId]);
  const { queue } = uploads;
  const items = useSyncExternalStore(queue.subscribe, queue.items, queue.items);
  const [earlier, setEarlier] = useState(uploads.earlier);
  useEffect(() => {
    readAgain = (id) => void client.invalidateQueries({ queryKey: captureKeys.detail(id) });
  }, [client]);
  useEffect(() => setEarlier(uploads.earlier), [uploads, items]);
  const forgetEarlier = useCallback(() => {
    uploads.earlier = writeBatch(captureId, [], queue.items());
    setEarlier([]);
  }, [captureId, queue, uploads]);
  return {
    items,
    keptCount: offlineCount(items) > 0 ? unheld(items).filter(isWorking).length : 0,
    workingCount: items.filter(isWorking).length,
    earlier,
    add: queue.add,
    setKind: queue.setKind,
    cancel: queue.cancel,
    cancelAll: queue.cancelAll,
    retry: queue.retry,
    retryNow: queue.wake,
    dismiss: queue.dismiss,
    forgetEarlier,
  };
}
