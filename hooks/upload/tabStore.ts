const held = new Map<string, string>();

/** Keeps a text for as long as the application runs. */
export function readTab(key: string): string | null {
  return held.get(key) ?? null;
}

/** Null forgets it. */
export function writeTab(key: string, value: string | null): void {
  if (value === null) held.delete(key);
  else held.set(key, value);
}
