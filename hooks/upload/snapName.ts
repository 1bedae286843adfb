const two = (value: number) => String(value).padStart(2, '0');

/** Name for a picture that the camera gave without one worth keeping: `snap-20260304-072341.jpg`. */
export function snapName(at: Date, fileName: string | null | undefined, mimeType: string | undefined): string {
  const ending = /\.[a-z0-9]{2,5}$/i.exec(fileName ?? '')?.[0] ?? (mimeType === 'image/png' ? '.png' : '.jpg');
  const day = `${at.getFullYear()}${two(at.getMonth() + 1)}${two(at.getDate())}`;
  return `snap-${day}-${two(at.getHours())}${two(at.getMinutes())}${two(at.getSeconds())}${ending.toLowerCase()}`;
}
