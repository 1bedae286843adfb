import { useState } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { fontFamily, radius } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

interface Props {
  label: string;
  value: string;
  unit: string;
  /** Share of the row. */
  flex?: number;
}

/** A number that stands alone: what it is above, its unit behind. */
export function NumberPlate({ label, value, unit, flex = 1 }: Props) {
  const { colours, desk } = useLook();
  const [width, setWidth] = useState(0);
  const inset = desk ? 16 : 12;
  const largest = desk ? 28 : 21;
  // Numbers shrink to their plate, with their unit; they are never cut. A figure is about 0.66 of its size wide.
  const room = width - inset - 6 - (desk ? 34 : 28);
  const size = width === 0 ? largest : Math.max(12, Math.min(largest, Math.floor(room / (value.length * 0.66))));
  return (
    <View
      onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}
      style={{
        flex,
        minWidth: 0,
        backgroundColor: colours.plate,
        borderRadius: radius.plate,
        paddingLeft: inset,
        paddingTop: desk ? 10 : 9,
        height: desk ? 84 : 66,
        overflow: 'hidden',
      }}
    >
      <Text variant="label" lines={1}>
        {label}
      </Text>
      <View style={{ flexDirection: 'row', alignItems: 'baseline' }}>
        <Text
          variant="medium"
          lines={1}
          style={{
            fontSize: size,
            lineHeight: size + 8,
            fontFamily: desk ? fontFamily.figureLight : fontFamily.figure,
          }}
        >
          {value}
        </Text>
        <Text variant="small" tone="ink1" style={{ marginLeft: 4, fontSize: desk ? 16 : 14 }}>
          {unit}
        </Text>
      </View>
    </View>
  );
}
