const fileOf = (entry: FileSystemFileEntry) => new Promise<File>((resolve, reject) => entry.file(resolve, reject));

/** All entries of a folder; the browser hands them out in portions until an empty one. */
async function entriesOf(folder: FileSystemDirectoryEntry): Promise<FileSystemEntry[]> {
  const reader = folder.createReader();
  const all: FileSystemEntry[] = [];
  for (;;) {
    const portion = await new Promise<FileSystemEntry[]>((resolve, reject) => reader.readEntries(resolve, reject));
    if (portion.length === 0) return all;
    all.push(...portion);
  }
}

async function filesUnder(entry: FileSystemEntry): Promise<File[]> {
  if (entry.isFile) return [await fileOf(entry as FileSystemFileEntry)];
  if (!entry.isDirectory) return [];
  const inside = await entriesOf(entry as FileSystemDirectoryEntry);
  return (await Promise.all(inside.map(filesUnder))).flat();
}

/** The files of a drop, those inside dropped folders among them, in the order of their names. Hidden files are left. */
export async function droppedFiles(transfer: DataTransfer): Promise<File[]> {
  // The list is emptied as soon as the event is over: take the entries first.
  const entries = Array.from(transfer.items, (item) => item.webkitGetAsEntry());
  const plain = Array.from(transfer.files);
  const files = entries.some((entry) => entry?.isDirectory)
    ? (await Promise.all(entries.map((entry) => (entry ? filesUnder(entry) : Promise.resolve([]))))).flat()
    : plain;
  return files
    .filter((file) => !file.name.startsWith('.'))
    .sort((a, b) => a.name.localeCompare(b.name, 'en', { numeric: true }));
}
