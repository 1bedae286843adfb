import { accountEndpoints } from './accounts';
import { benchEndpoints } from './benches';
import { captureEndpoints } from './captures';
import type { Endpoint } from './endpoint';
import { lotEndpoints } from './lots';
import { measurementEndpoints } from './measurements';
import { todayEndpoints } from './today';

/** Every endpoint of the API. */
export const endpoints = {
  ...accountEndpoints,
  ...benchEndpoints,
  ...lotEndpoints,
  ...captureEndpoints,
  ...measurementEndpoints,
  ...todayEndpoints,
} satisfies Record<string, Endpoint>;
