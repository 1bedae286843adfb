import path from 'node:path';
import prepareCluster from '../globalSetup';
import { startProduct, type Product } from './product';

const holder = globalThis as typeof globalThis & { ringwrightProduct?: Product };

/** Starts the product once for all browser tests; they reach it through `product()` of openProduct.ts. */
export default async function globalSetup(): Promise<void> {
  prepareCluster();
  const product = await startProduct(path.join(String(process.env.RINGWRIGHT_TEST_RUN), 'logs'));
  holder.ringwrightProduct = product;
  process.env.RINGWRIGHT_E2E_URL = product.url;
  process.env.RINGWRIGHT_E2E_NETWORK_URL = product.networkUrl;
}
