import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';

/** Names that are spelt out; of more only the number is said. */
const NAMED = 4;

export interface EarlierBatchProps {
  names: readonly string[];
  onChoose: () => void;
  onForget: () => void;
}

/** Says after a reload what did not arrive, and how to go on: a page cannot read chosen files again by itself. */
export function EarlierBatch({ names, onChoose, onForget }: EarlierBatchProps) {
  if (names.length === 0) return null;
  const listed = names.slice(0, NAMED).join(', ');
  const more = names.length > NAMED ? ` and ${names.length - NAMED} more` : '';
  return (
    <Plate surface="lift">
      <View role="status" style={{ gap: space.s }}>
        <Text variant="strong">
          {names.length === 1 ? 'One frame did not arrive' : `${names.length} frames did not arrive`}
        </Text>
        <Text variant="small">
          {`The last batch was broken off: ${listed}${more}. Choose the same files again; what is stored is skipped.`}
        </Text>
        <View style={{ flexDirection: 'row', gap: space.hair }}>
          <Button dense label="Choose files" icon="stills" onPress={onChoose} />
          <Button dense kind="quiet" label="Forget them" onPress={onForget} />
        </View>
      </View>
    </Plate>
  );
}
