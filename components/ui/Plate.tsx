import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { radius, space } from './tokens';
import { useLook } from './useLook';

export interface PlateProps {
  children?: ReactNode;
  /** `lift` for what comes first or is chosen, `well` for what is sunk. */
  surface?: 'plate' | 'lift' | 'well' | 'gap';
  /** Inner margin: `none`, or that of a block of text. */
  padding?: 'none' | 'block';
  label?: string;
  style?: StyleProp<ViewStyle>;
}

/** A surface. Plates meet at 2 px gaps; there are no borders and no shadows. */
export function Plate({ children, surface = 'plate', padding = 'block', label, style }: PlateProps) {
  const { colours, desk } = useLook();
  return (
    <View
      role={label ? 'group' : undefined}
      aria-label={label}
      style={[
        { backgroundColor: colours[surface], borderRadius: radius.plate },
        padding === 'block' ? { paddingVertical: desk ? 16 : 12, paddingHorizontal: desk ? 20 : space.l } : null,
        style,
      ]}
    >
      {children}
    </View>
  );
}
