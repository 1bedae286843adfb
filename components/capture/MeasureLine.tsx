import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

export interface MeasureLineProps {
  /** Lights whose newest run used fewer darks than there are now. */
  outdatedCount: number;
  /** Lights that nobody has asked to measure. */
  unmeasuredCount: number;
  busy: boolean;
  onMeasure: () => void;
}

/** Offers to measure what has no run, or a run with fewer darks than there are now. Nothing where nothing is owed. */
export function MeasureLine({ outdatedCount, unmeasuredCount, busy, onMeasure }: MeasureLineProps) {
  const { colours, desk } = useLook();
  const count = outdatedCount + unmeasuredCount;
  if (count === 0) return null;
  const words = [
    outdatedCount > 0
      ? `${outdatedCount === 1 ? 'One size was' : `${outdatedCount} sizes were`} measured with fewer darks than there are now.`
      : null,
    unmeasuredCount > 0
      ? `${unmeasuredCount === 1 ? 'One light is' : `${unmeasuredCount} lights are`} not measured yet.`
      : null,
  ].filter((part) => part !== null);
  return (
    <View
      style={{
        backgroundColor: colours.lift,
        borderRadius: radius.plate,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.s,
        paddingLeft: desk ? 20 : space.l,
        paddingRight: 8,
        paddingVertical: 4,
      }}
    >
      <Text variant="small" tone="ink0" style={{ flex: 1 }}>
        {words.join(' ')}
      </Text>
      <Button
        dense
        icon="retry"
        label={outdatedCount > 0 ? `Measure ${count} again` : `Measure ${count}`}
        busy={busy}
        onPress={onMeasure}
        style={{ backgroundColor: colours.gap }}
      />
    </View>
  );
}
