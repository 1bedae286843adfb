import { Platform } from 'react-native';
import { useGlobalSearchParams, usePathname, useSegments } from 'expo-router';

/** The address within the application, with its query: where a person wants to be after signing in. */
export function useAddress(): string {
  const path = usePathname();
  const segments: readonly string[] = useSegments();
  const params = useGlobalSearchParams();
  const inPath = new Set(
    segments.filter((segment) => segment.startsWith('[')).map((segment) => segment.replace(/[[\].]/g, '')),
  );
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(params)) {
    if (!inPath.has(name) && typeof value === 'string') query.set(name, value);
  }
  const text = query.toString();
  // Before the screen itself is drawn the router knows only its layout; the browser knows the whole address.
  if (Platform.OS === 'web') return `${window.location.pathname}${window.location.search}`;
  return text ? `${path}?${text}` : path;
}

/** An address given from outside, if it lies within the application; else the start. */
export function localAddress(address: string | undefined): string {
  return address !== undefined && /^\/(?![/\\])/.test(address) && !address.startsWith('/sign-in') ? address : '/';
}
