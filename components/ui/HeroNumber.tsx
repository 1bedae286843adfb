import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from './Text';
import { space } from './tokens';
import { useLook } from './useLook';

export interface HeroNumberProps {
  /** Already rounded to its uncertainty, without unit. */
  value: string;
  /** Already rounded, without sign. */
  uncertainty?: string;
  unit: string;
  /** Small, beside the uncertainty: “k = 2.0, 95 %, mean of 7”. */
  note?: ReactNode;
  /** Largest size of the figures, px; by layout when left out. */
  maxSize?: number;
}

/** Width of a text in the figures of the hero, in em: measured on the cut used. */
function widthEm(text: string): number {
  return [...text].reduce((sum, sign) => sum + ('.,\u2009 '.includes(sign) ? 0.26 : 0.65), 0);
}

/** The size: the largest thing on the screen, fitted to its plate, never wrapped. Uncertainty second, unit third. */
export function HeroNumber({ value, uncertainty, unit, note, maxSize }: HeroNumberProps) {
  const { layout, desk } = useLook();
  const [width, setWidth] = useState(0);
  const beside = layout !== 'phone';
  const cap = maxSize ?? (layout === 'tablet' ? 124 : desk ? 108 : 97);
  const room = width === 0 ? cap * 4 : beside ? width * 0.62 : width;
  const size = Math.min(cap, Math.floor(room / Math.max(2.4, widthEm(value))));
  const second = Math.max(18, Math.min(40, Math.round(size * 0.35)));
  const besideStyle = beside
    ? { fontSize: second, lineHeight: Math.round(second * 1.12), letterSpacing: -0.025 * second }
    : null;
  return (
    <View
      onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
      style={beside ? { flexDirection: 'row', alignItems: 'flex-end', gap: 22 } : { gap: 2 }}
    >
      <Text
        variant="hero"
        lines={1}
        style={{
          fontSize: size,
          lineHeight: Math.round(size * 0.95),
          letterSpacing: -0.045 * size,
          marginLeft: -Math.round(size * 0.055),
        }}
      >
        {value}
      </Text>
      <View
        style={
          beside
            ? { flexShrink: 1, paddingBottom: Math.round(size * 0.06) }
            : { flexDirection: 'row', alignItems: 'flex-end', justifyContent: 'space-between', gap: space.m }
        }
      >
        <Text variant="large" lines={1} style={besideStyle}>
          {uncertainty === undefined ? unit : `±\u2009${uncertainty}\u2009${unit}`}
        </Text>
        {typeof note === 'string' ? (
          <Text variant="small" tone="ink2" align={beside ? 'left' : 'right'} style={{ flexShrink: 1 }}>
            {note}
          </Text>
        ) : (
          note
        )}
      </View>
    </View>
  );
}
