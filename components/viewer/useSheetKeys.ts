import { useEffect, useRef, type RefObject } from 'react';
import type { View } from 'react-native';

export type SheetKey = 'in' | 'out' | 'fit' | 'left' | 'right' | 'up' | 'down';
const keys: Record<string, SheetKey> = {
  '+': 'in',
  '=': 'in',
  '-': 'out',
  '−': 'out',
  '0': 'fit',
  ArrowLeft: 'left',
  ArrowRight: 'right',
  ArrowUp: 'up',
  ArrowDown: 'down',
};

/** Keys of a focused part of the sheet. */
export function useSheetKeys(host: RefObject<View | null>, onKey: (key: SheetKey) => void): void {
  const latest = useRef(onKey);
  useEffect(() => {
    latest.current = onKey;
  });
  useEffect(() => {
    const element = host.current as unknown as HTMLElement | null;
    if (!element || typeof element.addEventListener !== 'function') return undefined;
    const down = (event: KeyboardEvent) => {
      const key = keys[event.key];
      if (!key || event.ctrlKey || event.metaKey || event.altKey) return;
      event.preventDefault();
      latest.current(key);
    };
    element.addEventListener('keydown', down);
    return () => element.removeEventListener('keydown', down);
  }, [host]);
}
