import { ViewSwitch } from '@/components/ui/ViewSwitch';
import type { FrameKind } from '@/shared/contracts/captures';

const kinds: readonly { value: FrameKind; label: string }[] = [
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
  { value: 'flat', label: 'Flat' },
];

/** What a frame is: guessed from its name, and a person’s to change. */
export function KindSwitch({ value, onChange }: { value: FrameKind; onChange: (kind: FrameKind) => void }) {
  return <ViewSwitch label="What the frame is" views={kinds} value={value} onChange={onChange} />;
}
