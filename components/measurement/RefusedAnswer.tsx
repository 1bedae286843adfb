import { View } from 'react-native';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { VerdictGlyph } from '@/components/ui/VerdictGlyph';
import type { FailureReason, RefusalReason } from '@/shared/contracts/measureResult';
import { refusalWords } from './words/refusalWords';

export interface RefusedAnswerProps {
  state: 'refused' | 'failed';
  reason: RefusalReason | FailureReason | null;
  /** The engine's own words for this frame. */
  message: string | null;
}

/** A reasoned “this cannot be measured”: the name of the fault, why there is no number, what to do in order. */
export function RefusedAnswer({ state, reason, message }: RefusedAnswerProps) {
  const { colours, desk } = useLook();
  const { name, why, steps } = refusalWords(reason);
  return (
    <View style={{ gap: space.hair }}>
      <Plate>
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 14 }}>
          {state === 'refused' ? (
            <VerdictGlyph verdict="refused" scale={1.4} />
          ) : (
            <StageGlyph stage="failed" size={28} />
          )}
          <Text variant="title" level={2} style={{ fontSize: 25, lineHeight: 30, flexShrink: 1 }}>
            {name}
          </Text>
        </View>
        <Text style={{ marginTop: 10 }} selectable>
          {message ?? why}
        </Text>
      </Plate>
      <View role="list" style={{ gap: space.hair, marginTop: space.s }}>
        {steps.map((step, i) => (
          <View
            key={step}
            role="listitem"
            style={{
              backgroundColor: colours.plate,
              flexDirection: 'row',
              alignItems: 'center',
              minHeight: 56,
              paddingVertical: 10,
              paddingRight: space.l,
            }}
          >
            <Text variant="medium" align="center" style={{ width: desk ? 56 : 44, fontSize: 22 }}>
              {i + 1}
            </Text>
            <Text style={{ flex: 1 }}>{step}</Text>
          </View>
        ))}
      </View>
    </View>
  );
}
