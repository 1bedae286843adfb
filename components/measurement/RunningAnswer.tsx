import { View } from 'react-native';
import { Plate } from '@/components/ui/Plate';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Stage } from '@/shared/contracts/measureResult';
import { stages } from '@/shared/contracts/measureResult';
import { stageWord } from './words/stageWords';

/** A measurement that is waiting or running: the plate of the number at its size, and what is being done. */
export function RunningAnswer({ state, stage }: { state: 'waiting' | 'measuring'; stage: Stage | null }) {
  const { colours, desk } = useLook();
  const now = stage === null ? -1 : stages.indexOf(stage);
  return (
    <Plate>
      <View aria-busy style={{ height: desk ? 100 : 92, justifyContent: 'center' }}>
        <View style={{ height: 1, width: 300, maxWidth: '100%', backgroundColor: colours.rule }} />
      </View>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
        <StageGlyph stage={state} size={24} />
        <Text variant="strong" live>
          {state === 'waiting' ? 'Waits its turn' : 'Measuring'}
        </Text>
      </View>
      <View role="list" style={{ marginTop: space.m, gap: space.xs }}>
        {stages.map((each, i) => (
          <View key={each} role="listitem" style={{ flexDirection: 'row', gap: space.m, alignItems: 'center' }}>
            <StageGlyph stage={i < now ? 'measured' : i === now ? 'measuring' : 'waiting'} size={16} />
            <Text variant="small" tone={i === now ? 'ink0' : 'ink2'}>
              {`${stageWord(each)}${i < now ? ', done' : ''}`}
            </Text>
          </View>
        ))}
      </View>
    </Plate>
  );
}
