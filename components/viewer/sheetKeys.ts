import { Platform } from 'react-native';

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

type KeyPress = Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'altKey' | 'preventDefault'>;

/** Attributes that let a part of the sheet hear its keys while it has the focus; none on a native device. */
export function sheetKeys(onKey: (key: SheetKey) => void): Record<string, unknown> {
  if (Platform.OS !== 'web') return {};
  return {
    onKeyDown: (event: KeyPress) => {
      const key = keys[event.key];
      if (!key || event.ctrlKey || event.metaKey || event.altKey) return;
      event.preventDefault();
      onKey(key);
    },
  };
}
