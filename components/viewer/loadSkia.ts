let loading: Promise<void> | undefined;

/**
 * Brings in the drawing engine once: its code and its WebAssembly, both from this site, and only when a drawing opens.
 * Rejects when they cannot be fetched; the next call tries again.
 */
export function loadSkia(): Promise<void> {
  loading ??= start().catch((error: unknown) => {
    loading = undefined;
    throw error;
  });
  return loading;
}

async function start(): Promise<void> {
  keepDrawingBufferSrgb();
  const { LoadSkiaWeb } = await import('@shopify/react-native-skia/lib/module/web');
  await LoadSkiaWeb({ locateFile: (file: string) => `/${file}` });
}

/**
 * Skia writes sRGB values and then labels its WebGL canvases Display P3, so every colour comes out too saturated.
 * The label is kept at sRGB.
 */
export function keepDrawingBufferSrgb(): void {
  const prototype = (globalThis as { WebGL2RenderingContext?: { prototype: object } }).WebGL2RenderingContext
    ?.prototype;
  if (!prototype || !('drawingBufferColorSpace' in prototype)) return;
  Object.defineProperty(prototype, 'drawingBufferColorSpace', {
    configurable: true,
    get: () => 'srgb',
    set: () => undefined,
  });
}
