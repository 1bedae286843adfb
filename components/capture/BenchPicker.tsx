import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Bench } from '@/shared/contracts/benches';
import { asEntered } from '@/components/measurement/asEntered';

export interface BenchPickerProps {
  benches: readonly Bench[];
  chosenId: string | null;
  onChoose: (benchId: string) => void;
}

/** The benches, with what a capture on them will use. */
export function BenchPicker({ benches, chosenId, onChoose }: BenchPickerProps) {
  const { desk, colours } = useLook();
  if (benches.length === 0) {
    return <EmptyState sentence="No bench yet. A manager adds one under Bench, with its laser, camera and distance." />;
  }
  return (
    <View role="radiogroup" aria-label="Bench" style={{ gap: space.hair }}>
      {benches.map((bench) => {
        const { current } = bench;
        const chosen = bench.id === chosenId;
        return (
          <Row
            key={bench.id}
            dense={desk}
            leading={<Icon name="bench" colour={chosen ? colours.ink0 : colours.ink1} />}
            title={bench.name}
            subtitle={`${asEntered(current.laser.wavelengthNm)} nm, ${asEntered(current.distanceMm)} mm, ${current.camera.name}`}
            choice
            selected={chosen}
            onPress={() => onChoose(bench.id)}
            label={`${bench.name}, ${asEntered(current.laser.wavelengthNm)} nm`}
            trailing={
              <Text variant="small" tone="ink2" lines={1}>
                {`revision ${current.revision}`}
              </Text>
            }
          />
        );
      })}
    </View>
  );
}
