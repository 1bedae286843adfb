import { useState } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import Svg, { Path, Rect } from 'react-native-svg';
import { useLook } from '@/components/ui/useLook';

export interface LotStripProps {
  apertureCount: number;
  measuredCount: number;
  refusedCount: number;
  style?: StyleProp<ViewStyle>;
}

/** One mark for each aperture of a lot: filled measured, two rails refused, hairline to do. Over 40 the marks become parts. */
export function LotStrip({ apertureCount, measuredCount, refusedCount, style }: LotStripProps) {
  const { colours } = useLook();
  const [width, setWidth] = useState(0);
  const marks = Math.min(40, apertureCount);
  const scale = apertureCount === 0 ? 0 : marks / apertureCount;
  const measured = Math.round(measuredCount * scale);
  const refused = Math.round(refusedCount * scale);
  const step = marks === 0 ? 0 : width / marks;
  return (
    <View
      role="img"
      aria-label={`${measuredCount} of ${apertureCount} measured${refusedCount > 0 ? `, ${refusedCount} refused` : ''}`}
      onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
      style={[{ height: 14 }, style]}
    >
      {width > 0 ? (
        <Svg width={width} height={14} aria-hidden>
          {Array.from({ length: marks }, (_, i) => {
            const x = i * step;
            const w = Math.max(1, step - 2);
            if (i < measured) return <Rect key={i} x={x} y={2} width={w} height={10} fill={colours.accent} />;
            if (i < measured + refused) {
              return (
                <Path
                  key={i}
                  d={`M${x} 3h${w}M${x} 11h${w}M${x + w * 0.3} 7h${w * 0.4}`}
                  stroke={colours.ink1}
                  strokeWidth={1.5}
                />
              );
            }
            return <Path key={i} d={`M${x} 7h${w}`} stroke={colours.ink3} strokeWidth={2} />;
          })}
        </Svg>
      ) : null}
    </View>
  );
}
