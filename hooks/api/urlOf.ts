import { Platform } from 'react-native';
import Constants from 'expo-constants';
import type { Endpoint } from '@/shared/contracts/endpoint';

/** The web build is served by the API itself; a native build is told the address of the laboratory's server. */
function origin(): string {
  if (Platform.OS === 'web') return '';
  const address: unknown = Constants.expoConfig?.extra?.['apiOrigin'];
  return typeof address === 'string' ? address : 'http://127.0.0.1:8480';
}

export interface AddressParts {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
}

/** Address of an endpoint with its parameters filled in; query values that are undefined or null are left out. */
export function urlOf(endpoint: Endpoint, { params = {}, query = {} }: AddressParts = {}): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined || value === null || value === '') throw new Error(`${endpoint.path} needs ${name}`);
    return encodeURIComponent(String(value));
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value === undefined || value === null) continue;
    search.set(name, Array.isArray(value) ? value.join(',') : String(value));
  }
  const text = search.toString();
  return `${origin()}/api${path}${text ? `?${text}` : ''}`;
}
