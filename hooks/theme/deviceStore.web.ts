/** Small choices remembered on this device. A browser that forbids storage only forgets them. */
export function readChoice(key: string): string | null {
  try {
    return window.localStorage.getItem(`ringwright.${key}`);
  } catch {
    return null;
  }
}

/** Remembers a choice; null forgets it. */
export function writeChoice(key: string, value: string | null): void {
  try {
    if (value === null) window.localStorage.removeItem(`ringwright.${key}`);
    else window.localStorage.setItem(`ringwright.${key}`, value);
  } catch {
    // Storage is full or forbidden: the choice holds until the page is closed.
  }
}
