import { File, Paths } from 'expo-file-system';

function fileOf(key: string): File {
  return new File(Paths.document, `choice-${key.replace(/[^a-z0-9-]/gi, '-')}.txt`);
}

/** Small choices remembered on this device. A device that cannot keep files only forgets them. */
export function readChoice(key: string): string | null {
  try {
    const file = fileOf(key);
    return file.exists ? file.textSync() : null;
  } catch {
    return null;
  }
}

/** Remembers a choice; null forgets it. */
export function writeChoice(key: string, value: string | null): void {
  try {
    const file = fileOf(key);
    if (value === null) {
      if (file.exists) file.delete();
      return;
    }
    if (!file.exists) file.create();
    file.write(value);
  } catch {
    // Storage is full or forbidden: the choice holds until the application is closed.
  }
}
