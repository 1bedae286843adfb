import { router, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import {
  Platform,
  Pressable,
  type GestureResponderEvent,
  type Role,
  type StyleProp,
  type ViewStyle,
} from 'react-native';
import { webProps } from './webProps';

export interface TouchProps {
  children: ReactNode;
  onPress?: () => void;
  /** Makes it a link: opens in a new tab with the middle button, and the address can be copied. */
  href?: Href;
  label?: string;
  role?: Role;
  disabled?: boolean;
  /** For tabs and rows that can be chosen. */
  selected?: boolean;
  checked?: boolean | 'mixed';
  expanded?: boolean;
  /** Marks the place where one is. */
  current?: boolean;
  style?: StyleProp<ViewStyle> | ((state: { pressed: boolean }) => StyleProp<ViewStyle>);
  testID?: string;
}

function addressOf(href: Href): string {
  return typeof href === 'string' ? href : String(href.pathname);
}

/** Roles that the space bar acts on, though the platform acts for it on buttons only. */
const SPACE_ROLES: readonly (Role | undefined)[] = ['checkbox', 'radio', 'switch', 'tab', 'option'];

interface KeyPress {
  key: string;
  preventDefault(): void;
  stopPropagation(): void;
}

/** What is touched: a button or a link, with focus, keys and names as the platform expects them. */
export function Touch({
  children,
  onPress,
  href,
  label,
  role,
  disabled,
  selected,
  checked,
  expanded,
  current,
  style,
  testID,
}: TouchProps) {
  const web: Record<string, string | number | boolean | undefined> = {};
  if (current) web['aria-current'] = 'page';
  if (href !== undefined) web['href'] = addressOf(href);
  const pressSpace = (event: KeyPress) => {
    if (event.key !== ' ' || disabled) return;
    event.preventDefault();
    event.stopPropagation();
    onPress?.();
  };
  const press = (event: GestureResponderEvent) => {
    if (href !== undefined) {
      if (Platform.OS === 'web') {
        const native = event.nativeEvent as unknown as MouseEvent;
        if (native.metaKey || native.ctrlKey || native.shiftKey || native.button === 1) return;
        event.preventDefault();
      }
      onPress?.();
      router.push(href);
      return;
    }
    onPress?.();
  };
  return (
    <Pressable
      testID={testID}
      role={role ?? (href !== undefined ? 'link' : 'button')}
      aria-label={label}
      aria-disabled={disabled || undefined}
      aria-selected={selected}
      aria-checked={checked}
      aria-expanded={expanded}
      disabled={disabled}
      onPress={press}
      {...webProps(web)}
      {...(Platform.OS === 'web' && SPACE_ROLES.includes(role) ? { onKeyDownCapture: pressSpace } : {})}
      style={({ pressed }) => (typeof style === 'function' ? style({ pressed }) : style)}
    >
      {children}
    </Pressable>
  );
}
