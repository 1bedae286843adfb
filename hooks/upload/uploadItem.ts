import type { FrameKind } from '@/shared/contracts/captures';
import type { FrameSource } from './frameSource';

/**
 * Where a file stands on its way.
 * `checking` kind and size; `unfit` is not sent, `problem` says why; `hashing`; `hashed` waits to ask whether it is
 * stored; `ready` waits its turn; `sending`; `offline` waits for the network and goes out by itself; `stored` was sent;
 * `known` was stored before and is skipped; `failed` was turned away, `problem` says why; `cancelled` by a person.
 */
export type UploadState =
  | 'checking'
  | 'unfit'
  | 'hashing'
  | 'hashed'
  | 'ready'
  | 'sending'
  | 'offline'
  | 'stored'
  | 'known'
  | 'failed'
  | 'cancelled';

export interface UploadItem {
  id: string;
  source: FrameSource;
  name: string;
  kind: FrameKind;
  state: UploadState;
  sha256: string | null;
  /** Part that is done of what `state` says, 0 to 1. */
  part: number;
  /** Of the upload under way; null before it can be told. */
  secondsLeft: number | null;
  problem: string | null;
  /** The file of the same batch with the same bytes that goes in its place. */
  twinOf: string | null;
  /** Attempts that the network or the server broke off. */
  attempts: number;
}

const WORKING: readonly UploadState[] = ['checking', 'hashing', 'hashed', 'ready', 'sending', 'offline'];

/** Whether the file still has to go somewhere by itself. */
export const isWorking = (item: UploadItem): boolean => WORKING.includes(item.state);
/** Whether the laboratory holds the file now. */
export const isHeld = (item: UploadItem): boolean => item.state === 'stored' || item.state === 'known';
/** Whether the kind may still be changed here; afterwards it is changed in the capture. */
export const isKindOpen = (item: UploadItem): boolean =>
  (isWorking(item) && item.state !== 'sending') || item.state === 'failed';
