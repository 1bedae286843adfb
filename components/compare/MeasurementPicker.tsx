import { View } from 'react-native';
import { CheckBox } from '@/components/ui/CheckBox';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Measurement } from '@/shared/contracts/measurements';
import { formatMeasured } from '@/shared/units/format';

export interface MeasurementPickerProps {
  measurements: readonly Measurement[];
  chosenIds: readonly string[];
  onChange: (chosenIds: string[]) => void;
  /** Pieces that were left out of the line are lifted. */
  oddIds: readonly string[];
}

/** The measured sizes to choose from, newest first. */
export function MeasurementPicker({ measurements, chosenIds, onChange, oddIds }: MeasurementPickerProps) {
  const { colours, desk } = useLook();
  return (
    <View role="list" aria-label="Measured sizes" style={{ gap: space.hair }}>
      {measurements.map((measurement) => {
        const chosen = chosenIds.includes(measurement.id);
        const { value, uncertainty } = formatMeasured(measurement.sizeUm, measurement.expandedUncertaintyUm);
        return (
          <View
            key={measurement.id}
            role="listitem"
            style={{
              backgroundColor: oddIds.includes(measurement.id) ? colours.lift : colours.plate,
              borderRadius: radius.plate,
              paddingHorizontal: desk ? 12 : space.l,
            }}
          >
            <CheckBox
              checked={chosen}
              label={`${measurement.apertureSerial}, ${value} µm, ${measurement.frameName}`}
              onChange={(on) =>
                onChange(on ? [...chosenIds, measurement.id] : chosenIds.filter((id) => id !== measurement.id))
              }
            >
              <View style={{ flex: 1, minWidth: 0, paddingVertical: 6 }}>
                <Text variant="strong" lines={1}>
                  {measurement.apertureSerial}
                </Text>
                <Text variant="label" lines={1}>
                  {measurement.frameName}
                </Text>
              </View>
              <Text lines={1}>
                <Text variant="medium" style={{ fontSize: 17, lineHeight: 22 }}>
                  {value}
                </Text>
                <Text tone="ink2">{uncertainty === null ? '' : ` ± ${uncertainty}`}</Text>
              </Text>
            </CheckBox>
          </View>
        );
      })}
    </View>
  );
}
