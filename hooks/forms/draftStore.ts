/** Drafts of forms, kept until the application is closed. */
const drafts = new Map<string, string>();

export function readDraft(key: string): string | null {
  return drafts.get(key) ?? null;
}

export function writeDraft(key: string, text: string | null): void {
  if (text === null) drafts.delete(key);
  else drafts.set(key, text);
}

/** A native application is not left by closing a tab. */
export function warnBeforeLeaving(_dirty: () => boolean): () => void {
  return () => undefined;
}
