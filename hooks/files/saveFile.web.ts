/** Saves a text as a file, by a link to it that is pressed at once. */
export async function saveFile(name: string, text: string, mimeType: string): Promise<void> {
  const address = URL.createObjectURL(new Blob([text], { type: `${mimeType};charset=utf-8` }));
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The download has begun when the click returns; the address is given back a little later to be safe.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
