import { Platform } from 'react-native';

/** Attributes that only the web knows, such as `aria-invalid`; nothing on a native device. */
export function webProps(props: Record<string, string | number | boolean | undefined>): Record<string, unknown> {
  return Platform.OS === 'web' ? props : {};
}
