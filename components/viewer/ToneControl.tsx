import { View } from 'react-native';
import { ViewSwitch } from '@/components/ui/ViewSwitch';
import { useLook } from '@/components/ui/useLook';
import { LayerToggle } from './LayerToggle';
import type { Tone } from './levels';
import type { ViewerState } from './useViewerState';

const toneViews: readonly { value: Tone; label: string }[] = [
  { value: 'linear', label: 'Linear' },
  { value: 'root', label: 'Root' },
  { value: 'log', label: 'Log' },
];

/** How counts become light: tone curve, own colour or neutral, light drawn as ink. */
export function ToneControl({ state }: { state: ViewerState }) {
  const { desk } = useLook();
  return (
    <View style={{ gap: desk ? 2 : 0 }}>
      <ViewSwitch label="Tone" views={toneViews} value={state.tone} onChange={state.setTone} />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 20, paddingHorizontal: desk ? 0 : 16 }}>
        <LayerToggle label="Own colour" on={state.ownColour} onChange={state.setOwnColour} />
        <LayerToggle label="Negative" on={state.negative} onChange={state.setNegative} />
      </View>
    </View>
  );
}
