import type { Href } from 'expo-router';
import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

export interface SaveFootProps {
  /** “Save the laser”. */
  label: string;
  busy: boolean;
  onSave: () => void;
  cancel: Href;
}

/** At the foot of a form: leave, and the one button that goes on. */
export function SaveFoot({ label, busy, onSave, cancel }: SaveFootProps) {
  const { desk } = useLook();
  return (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      <Button label="Back" icon="back" fullBleed={!desk} href={cancel} style={{ minHeight: desk ? 56 : 68 }} />
      <Button
        label={label}
        kind="primary"
        fullBleed={!desk}
        busy={busy}
        onPress={onSave}
        trailing="tick"
        style={{ flex: 1, minHeight: desk ? 56 : 68 }}
        testID="save"
      />
    </View>
  );
}
