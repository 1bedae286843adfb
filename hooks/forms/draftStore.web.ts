const prefix = 'ringwright.draft.';

/** Drafts of forms, kept until the tab is closed; a browser that forbids storage keeps none. */
export function readDraft(key: string): string | null {
  try {
    return window.sessionStorage.getItem(prefix + key);
  } catch {
    return null;
  }
}

export function writeDraft(key: string, text: string | null): void {
  try {
    if (text === null) window.sessionStorage.removeItem(prefix + key);
    else window.sessionStorage.setItem(prefix + key, text);
  } catch {
    // Storage is full or forbidden: the browser still asks before the tab is closed.
  }
}

/** Lets the browser ask before a tab with an unsaved form is closed or loaded again; returns how to stop. */
export function warnBeforeLeaving(dirty: () => boolean): () => void {
  const ask = (event: BeforeUnloadEvent) => {
    if (dirty()) event.preventDefault();
  };
  window.addEventListener('beforeunload', ask);
  return () => window.removeEventListener('beforeunload', ask);
}
