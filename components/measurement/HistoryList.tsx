import { View } from 'react-native';
import { Row } from '@/components/ui/Row';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { formatDateTime, formatMeasuredText } from '@/shared/units/format';
import { stateWord } from './words/stageWords';

/** Every run of the same frame, newest first; none is ever changed or removed. */
export function HistoryList({ measurement }: { measurement: MeasurementDetail }) {
  const { colours, desk } = useLook();
  return (
    <View>
      <View
        style={{
          backgroundColor: colours.plate,
          paddingHorizontal: desk ? 20 : space.l,
          paddingTop: 12,
          paddingBottom: 6,
        }}
      >
        <Text variant="section" level={2}>
          History
        </Text>
        <Text variant="label">
          {measurement.history.length === 1
            ? 'The only run of this frame'
            : `${measurement.history.length} runs of this frame`}
        </Text>
      </View>
      <View style={{ gap: space.hair }}>
        {measurement.history.map((run) => {
          const size =
            run.sizeUm === null
              ? stateWord(run.state, null)
              : formatMeasuredText(run.sizeUm, run.expandedUncertaintyUm, 'µm');
          const darks = run.darkCount === 1 ? '1 dark' : `${run.darkCount} darks`;
          return (
            <Row
              key={run.id}
              dense
              leading={<StageGlyph stage={run.state} />}
              title={size}
              subtitle={`${formatDateTime(run.createdAt)}, ${run.createdBy}, ${darks}`}
              selected={run.id === measurement.id && measurement.history.length > 1}
              href={run.id === measurement.id ? undefined : `/measurements/${run.id}`}
            />
          );
        })}
      </View>
    </View>
  );
}
