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
  // Long numbers shrink; they are never cut.
  const size = Math.round((desk ? 28 : 21) * Math.min(1, 6.4 / value.length));
  return (
    <View
      style={{
        flex,
        minWidth: 0,
        backgroundColor: colours.plate,
        borderRadius: radius.plate,
        paddingLeft: desk ? 16 : 14,
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
