import { View } from 'react-native';
import { useLook } from '@/components/ui/useLook';
import { formatNumber } from '@/shared/units/format';
import { LayerToggle } from './LayerToggle';
import type { ViewerState } from './useViewerState';

interface Props {
  state: ViewerState;
  /** Rings and centre exist. */
  measured: boolean;
  /** Null: no mask is known. */
  maskedPixels: number | null;
}

/** What lies over the frame. */
export function LayersList({ state, measured, maskedPixels }: Props) {
  const { desk } = useLook();
  const { layers, setLayer } = state;
  return (
    <View style={desk ? null : { flexDirection: 'row', flexWrap: 'wrap', columnGap: 24, paddingHorizontal: 16 }}>
      {measured ? (
        <>
          <LayerToggle label="Rings, fitted" on={layers.fitted} onChange={(on) => setLayer('fitted', on)} />
          <LayerToggle label="Centre" on={layers.centre} onChange={(on) => setLayer('centre', on)} />
          <LayerToggle label="Rings, measured" on={layers.measured} onChange={(on) => setLayer('measured', on)} />
        </>
      ) : null}
      {maskedPixels !== null ? (
        <LayerToggle
          label={`Mask, ${formatNumber(maskedPixels, { places: 0 })} pixels`}
          on={layers.mask}
          onChange={(on) => setLayer('mask', on)}
        />
      ) : null}
      <LayerToggle label="Line" on={layers.line} onChange={(on) => setLayer('line', on)} />
    </View>
  );
}
