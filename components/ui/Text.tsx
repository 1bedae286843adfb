import type { ReactNode } from 'react';
import { Text as NativeText, type StyleProp, type TextStyle } from 'react-native';
import type { TypeName } from './tokens';
import { useLook } from './useLook';
import { webProps } from './webProps';

export type Tone = 'ink0' | 'ink1' | 'ink2' | 'accent' | 'onAccent' | 'gap';

export interface TextProps {
  children: ReactNode;
  variant?: TypeName;
  tone?: Tone;
  /** Makes it a heading of this level for screen readers. */
  level?: 1 | 2 | 3;
  align?: 'left' | 'right' | 'center';
  lines?: number;
  selectable?: boolean;
  /** Read out at once when it changes. */
  live?: boolean;
  id?: string;
  style?: StyleProp<TextStyle>;
}

const figures: readonly TypeName[] = ['hero', 'large', 'medium'];
const standing: readonly TypeName[] = ['hero', 'large', 'medium', 'title', 'section', 'strong'];

/** All text. Figures are tabular everywhere; numbers that stand alone and titles are in ink0. */
export function Text({
  children,
  variant = 'body',
  tone,
  level,
  align,
  lines,
  selectable,
  live,
  id,
  style,
}: TextProps) {
  const { colours, type } = useLook();
  const colour = tone ?? (standing.includes(variant) ? 'ink0' : variant === 'label' ? 'ink2' : 'ink1');
  return (
    <NativeText
      id={id}
      role={level ? 'heading' : undefined}
      aria-live={live ? 'polite' : undefined}
      numberOfLines={lines}
      selectable={selectable}
      {...(level ? webProps({ 'aria-level': level }) : {})}
      style={[
        type[variant],
        { color: colours[colour], fontVariant: ['tabular-nums', 'lining-nums'] },
        figures.includes(variant) ? { flexShrink: 0 } : null,
        align ? { textAlign: align } : null,
        style,
      ]}
    >
      {children}
    </NativeText>
  );
}
