import { createContext, useContext, type ReactNode } from 'react';
import type { Href } from 'expo-router';
import type { IconName } from './iconDrawings';

/** A place of the shell: an entry of the rail or of the foot. */
export interface Place {
  key: string;
  label: string;
  icon: IconName;
  href: Href;
}

export interface ShellPlaces {
  /** On the rail of a desk, top to bottom. */
  rail: readonly Place[];
  /** On the foot of a phone or tablet: at most five. */
  foot: readonly Place[];
  /** Key of the place where one is. */
  current: string;
}

const ShellContext = createContext<ShellPlaces>({ rail: [], foot: [], current: '' });

export function ShellPlacesProvider({ places, children }: { places: ShellPlaces; children: ReactNode }) {
  return <ShellContext.Provider value={places}>{children}</ShellContext.Provider>;
}

export function useShellPlaces(): ShellPlaces {
  return useContext(ShellContext);
}
