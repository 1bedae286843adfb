import type { Href } from 'expo-router';
import { Button } from '@/components/ui/Button';
import { ActionFoot } from '@/components/ui/ActionFoot';

export interface SaveFootProps {
  /** “Save the laser”. */
  label: string;
  busy: boolean;
  onSave: () => void;
  cancel: Href;
}

/** At the foot of a form: leave, and the one button that goes on. */
export function SaveFoot({ label, busy, onSave, cancel }: SaveFootProps) {
  return (
    <ActionFoot
      secondary={<Button label="Back" icon="back" href={cancel} />}
      primary={<Button label={label} kind="primary" busy={busy} onPress={onSave} trailing="tick" testID="save" />}
    />
  );
}
