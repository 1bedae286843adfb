import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { CheckBox } from '@/components/ui/CheckBox';
import { ChoiceField } from '@/components/ui/ChoiceField';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { MeasurementSettings } from '@/shared/contracts/measurements';

const encodings: readonly { value: MeasurementSettings['encoding']; label: string }[] = [
  { value: 'auto', label: 'Find out' },
  { value: 'linear', label: 'Linear, as the sensor gives it' },
  { value: 'srgb', label: 'sRGB' },
  { value: 'rendered', label: 'Rendered by the camera, curve unknown' },
];
const mosaics: readonly { value: MeasurementSettings['mosaic']; label: string }[] = [
  { value: 'auto', label: 'Find out' },
  { value: 'mono', label: 'None, every pixel counts' },
  { value: 'rggb', label: 'Mosaic, red first (RGGB)' },
  { value: 'grbg', label: 'Mosaic, green then red (GRBG)' },
  { value: 'gbrg', label: 'Mosaic, green then blue (GBRG)' },
  { value: 'bggr', label: 'Mosaic, blue first (BGGR)' },
];

export interface AgainFormProps {
  settings: MeasurementSettings;
  busy: boolean;
  problem: string | null;
  onMeasure: (settings: MeasurementSettings) => void;
  onClose: () => void;
}

/** Measures the same frame again with other settings; the run that is shown stays as it is. */
export function AgainForm({ settings, busy, problem, onMeasure, onClose }: AgainFormProps) {
  const [chosen, setChosen] = useState(settings);
  return (
    <Plate surface="lift" label="Measure again">
      <View style={{ gap: space.s }}>
        <Text variant="section" level={2}>
          Measure again
        </Text>
        <Text variant="small">The same frame is measured with these settings. This run stays as it is.</Text>
        <CheckBox
          checked={chosen.useDarks}
          onChange={(useDarks) => setChosen({ ...chosen, useDarks })}
          label="Take the darks off"
        />
        <ChoiceField
          label="Tone of the file"
          value={chosen.encoding}
          choices={encodings}
          onChange={(encoding) => setChosen({ ...chosen, encoding })}
        />
        <ChoiceField
          label="Colour filter on the sensor"
          value={chosen.mosaic}
          choices={mosaics}
          onChange={(mosaic) => setChosen({ ...chosen, mosaic })}
        />
        {problem ? (
          <Text variant="small" tone="ink0" live>
            {problem}
          </Text>
        ) : null}
        <View style={{ flexDirection: 'row', gap: space.hair }}>
          <Button label="Close" kind="quiet" onPress={onClose} />
          <Button
            label="Measure again"
            kind="primary"
            icon="retry"
            trailing={null}
            busy={busy}
            onPress={() => onMeasure(chosen)}
            style={{ flex: 1 }}
          />
        </View>
      </View>
    </Plate>
  );
}
