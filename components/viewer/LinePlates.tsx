import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { IconButton } from '@/components/ui/IconButton';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { LineSegment } from '@/shared/optics/lineProfile';
import { formatNumber, formatQuantity } from '@/shared/units/format';

interface Props {
  segment: LineSegment | null;
  onSegment: (segment: LineSegment) => void;
  pixelPitchUm: number | null;
  onSave: () => void;
  saving: boolean;
  /** What went wrong with the last save. */
  problem: string | null;
}

const WIDTHS = [1, 3, 5, 9, 15, 25, 51] as const;

/** The line in numbers: its length, the width averaged across it, and its profile as a file. */
export function LinePlates({ segment, onSegment, pixelPitchUm, onSave, saving, problem }: Props) {
  const { colours, desk } = useLook();
  if (!segment) return null;
  const lengthPx = Math.hypot(segment.x1 - segment.x0, segment.y1 - segment.y0);
  const at = WIDTHS.findIndex((w) => w >= segment.widthPx);
  const step = (by: 1 | -1) => {
    const next = WIDTHS[Math.min(WIDTHS.length - 1, Math.max(0, at + by))] ?? 1;
    onSegment({ ...segment, widthPx: next });
  };
  const plate = { backgroundColor: colours.plate, borderRadius: radius.plate, minHeight: desk ? 84 : 66 };
  const length =
    pixelPitchUm === null
      ? formatQuantity(lengthPx, 'px', { places: 0 })
      : formatQuantity((lengthPx * pixelPitchUm) / 1000, 'mm', { places: 3 });
  return (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      <View style={[plate, { flex: 1, paddingLeft: 14, paddingTop: 9, minWidth: 0 }]}>
        <Text variant="label">Line, length</Text>
        <Text variant="strong" lines={1}>
          {length}
        </Text>
        {problem ? (
          <Text variant="label" live>
            {problem}
          </Text>
        ) : null}
      </View>
      <View style={[plate, { paddingLeft: 12, paddingTop: 9 }]}>
        <Text variant="label">Averaged over</Text>
        <View style={{ flexDirection: 'row', alignItems: 'center', marginTop: -10 }}>
          <Text variant="strong" style={{ width: 46 }}>{`${formatNumber(segment.widthPx, { places: 0 })} px`}</Text>
          <IconButton icon="minus" label="Narrower line" onPress={() => step(-1)} disabled={at <= 0} />
          <IconButton icon="plus" label="Wider line" onPress={() => step(1)} disabled={at >= WIDTHS.length - 1} />
        </View>
      </View>
      <View style={[plate, { justifyContent: 'center', paddingHorizontal: 4 }]}>
        <Button
          label={desk ? 'Get line as CSV' : 'Get CSV'}
          icon="get"
          kind="quiet"
          dense
          busy={saving}
          onPress={onSave}
        />
      </View>
    </View>
  );
}
