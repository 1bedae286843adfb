const PREFIX = 'ringwright.';

/** Keeps a text for as long as the tab is open, over reloads. A browser that forbids storage only forgets it. */
export function readTab(key: string): string | null {
  try {
    return window.sessionStorage.getItem(PREFIX + key);
  } catch {
    return null;
  }
}

/** Null forgets it. */
export function writeTab(key: string, value: string | null): void {
  try {
    if (value === null) window.sessionStorage.removeItem(PREFIX + key);
    else window.sessionStorage.setItem(PREFIX + key, value);
  } catch {
    // Storage is full or forbidden: after a reload nobody is told of the unfinished batch, and nothing else is lost.
  }
}
