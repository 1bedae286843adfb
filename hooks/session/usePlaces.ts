import { usePathname } from 'expo-router';
import { BENCH, STAFF, type Role } from '@/shared/contracts/roles';
import { useRole } from './SessionProvider';

export interface PlaceOfApp {
  key: 'today' | 'capture' | 'lots' | 'compare' | 'bench' | 'people' | 'account' | 'more';
  label: string;
  icon: 'today' | 'capture' | 'lots' | 'compare' | 'bench' | 'people' | 'lock' | 'more';
  href: '/' | '/capture' | '/lots' | '/compare' | '/bench' | '/people' | '/account' | '/more';
}

const today: PlaceOfApp = { key: 'today', label: 'Today', icon: 'today', href: '/' };
const capture: PlaceOfApp = { key: 'capture', label: 'Capture', icon: 'capture', href: '/capture' };
const lots: PlaceOfApp = { key: 'lots', label: 'Lots', icon: 'lots', href: '/lots' };
const compare: PlaceOfApp = { key: 'compare', label: 'Compare', icon: 'compare', href: '/compare' };
const bench: PlaceOfApp = { key: 'bench', label: 'Bench', icon: 'bench', href: '/bench' };
const people: PlaceOfApp = { key: 'people', label: 'People', icon: 'people', href: '/people' };

/** The places of a role: those of everyday work, and with `rail` those that a desk has room for. */
export function placesOf(role: Role): { daily: readonly PlaceOfApp[]; rail: readonly PlaceOfApp[] } {
  const daily = STAFF.includes(role)
    ? [today, ...(BENCH.includes(role) ? [capture] : []), lots, compare, bench]
    : [today, lots];
  return { daily, rail: role === 'manager' ? [...daily, people] : daily };
}

/** To which place an address belongs; captures and measurements are reached from the lots. */
export function placeOfPath(path: string): string {
  const first = path.split('/')[1] ?? '';
  if (first === '') return 'today';
  if (first === 'captures' || first === 'capture') return 'capture';
  if (first === 'measurements') return 'lots';
  return first;
}

/** Places of the person signed in, and where they are now. */
export function usePlaces(): { rail: readonly PlaceOfApp[]; foot: readonly PlaceOfApp[]; current: string } {
  const role = useRole();
  const path = usePathname();
  const { daily, rail } = placesOf(role);
  return { rail, foot: daily, current: placeOfPath(path) };
}
