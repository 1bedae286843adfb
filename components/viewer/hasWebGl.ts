let known: boolean | undefined;

/** Whether this browser gives a WebGL 2 context; asked once, and the probe is let go at once. */
export function hasWebGl(): boolean {
  if (known !== undefined) return known;
  try {
    const context = document.createElement('canvas').getContext('webgl2');
    known = context !== null;
    context?.getExtension('WEBGL_lose_context')?.loseContext();
  } catch {
    known = false;
  }
  return known;
}
