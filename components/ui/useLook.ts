import { useMemo } from 'react';
import { useWindowDimensions } from 'react-native';
import { useThemeState, type ThemeName } from '@/hooks/theme/ThemeProvider';
import {
  coloursFor,
  layoutForWidth,
  typeScale,
  type Colours,
  type LayoutName,
  type TypeName,
  type TypeStyle,
} from './tokens';

export interface Look {
  theme: ThemeName;
  colours: Colours;
  type: Record<TypeName, TypeStyle>;
  layout: LayoutName;
  /** True from 1200 px on: rail and panels instead of one column. */
  desk: boolean;
  widthPx: number;
  heightPx: number;
}

/** Everything a component needs to draw itself: colours, type and layout of the moment. */
export function useLook(): Look {
  const { theme, light } = useThemeState();
  const { width, height } = useWindowDimensions();
  const layout = layoutForWidth(width);
  const desk = layout === 'desk' || layout === 'wide';
  const colours = useMemo(() => coloursFor(theme, light.wavelengthNm), [theme, light.wavelengthNm]);
  return { theme, colours, type: typeScale[desk ? 'desk' : 'hand'], layout, desk, widthPx: width, heightPx: height };
}
