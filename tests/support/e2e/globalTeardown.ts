import discardCluster from '../globalTeardown';
import type { Product } from './product';

/** Ends what the global setup started. */
export default async function globalTeardown(): Promise<void> {
  const holder = globalThis as typeof globalThis & { ringwrightProduct?: Product };
  await holder.ringwrightProduct?.stop();
  discardCluster();
}
