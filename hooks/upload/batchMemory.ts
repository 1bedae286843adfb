import { z } from 'zod';
import { frameKinds } from '@/shared/contracts/captures';
import { readTab, writeTab } from './tabStore';
import { unheld } from './uploadQueue';
import type { UploadItem } from './uploadItem';

const rememberedSchema = z.array(z.object({ name: z.string(), sizeBytes: z.number(), kind: z.enum(frameKinds) }));
/** Files of a batch that was broken off: known by name only, a page cannot read them again by itself. */
export type RememberedFile = z.infer<typeof rememberedSchema>[number];

const keyOf = (captureId: string) => `batch.${captureId}`;

/** What an earlier visit of this tab left unsent in the capture. */
export function readBatch(captureId: string): RememberedFile[] {
  const text = readTab(keyOf(captureId));
  if (text === null) return [];
  try {
    return rememberedSchema.parse(JSON.parse(text));
  } catch {
    return [];
  }
}

/**
 * Remembers what is not stored yet: of `earlier` what has not been chosen again, and of `items` what is under way.
 * A file chosen again is known by its name and size.
 */
export function writeBatch(
  captureId: string,
  earlier: readonly RememberedFile[],
  items: readonly UploadItem[],
): RememberedFile[] {
  const open = earlier.filter(
    (file) => !items.some((item) => item.name === file.name && item.source.sizeBytes === file.sizeBytes),
  );
  const now = unheld(items).map(({ name, kind, source }) => ({ name, kind, sizeBytes: source.sizeBytes }));
  const all = [...open, ...now];
  writeTab(keyOf(captureId), all.length === 0 ? null : JSON.stringify(all));
  return open;
}
