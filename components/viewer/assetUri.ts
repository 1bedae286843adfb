/** Address of a bundled file. The web build turns such a module into its address, plain or in an object. */
export function assetUri(module: unknown): string {
  if (typeof module === 'string') return module;
  if (typeof module === 'object' && module !== null && 'uri' in module && typeof module.uri === 'string')
    return module.uri;
  throw new TypeError('This build does not give the address of a bundled file.');
}
