import { View } from 'react-native';
import { ProgressRing } from '@/components/ui/ProgressRing';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { CaptureDetail } from '@/shared/contracts/captures';
import { formatMeasured } from '@/shared/units/format';
import type { CaptureRow } from './captureRows';
import { ringSegments } from './ringSegments';

export interface MeanSoFarProps {
  serial: string;
  mean: CaptureDetail['mean'];
  lights: readonly CaptureRow[];
}

/** Widths of the figures in em of the font size, on the wide side; for fitting the mean beside the ring. */
const FIGURE_EM = 0.66;

/** The ring of files and the mean of their sizes as far as it has come. */
export function MeanSoFar({ serial, mean, lights }: MeanSoFarProps) {
  const { desk, widthPx } = useLook();
  const segments = ringSegments(lights);
  const measured = segments.filter((segment) => segment.state === 'measured').length;
  const refused = segments.filter((segment) => segment.state === 'refused').length;
  const text = mean ? formatMeasured(mean.sizeUm, mean.expandedUncertaintyUm) : null;
  const room = desk ? 260 : Math.min(widthPx, 600) - 160;
  const size = text ? Math.min(desk ? 66 : 46, Math.floor(room / (text.value.length * FIGURE_EM))) : 46;
  const many = segments.length === 1 ? 'size' : 'sizes';
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: desk ? 22 : space.l, flexShrink: 1 }}>
      <ProgressRing
        segments={segments.length === 0 ? [{ state: 'waiting' }] : segments}
        size={desk ? 132 : 112}
        label={`${measured} of ${segments.length} ${many}${refused > 0 ? `, ${refused} refused` : ''}`}
      >
        <Text variant="large" style={{ fontSize: desk ? 40 : 34, lineHeight: desk ? 42 : 36 }}>
          {measured}
        </Text>
        <Text variant="label">{segments.length === 0 ? 'sizes' : `of ${segments.length} ${many}`}</Text>
      </ProgressRing>
      <View style={{ flexShrink: 1 }}>
        <Text variant="label">{desk ? `${serial}, mean so far` : 'Mean so far'}</Text>
        {text ? (
          <>
            <Text
              variant="hero"
              live
              style={{ fontSize: size, lineHeight: size + 3, letterSpacing: -0.04 * size, marginLeft: -3 }}
            >
              {text.value}
            </Text>
            <Text variant="medium" lines={1} style={desk ? { fontSize: 28, lineHeight: 32 } : null}>
              {text.uncertainty === null ? 'µm' : `±\u2009${text.uncertainty}\u2009µm`}
            </Text>
            <Text variant="label">
              {mean && mean.count > 1 ? `mean of ${mean.count}, ` : 'one frame, '}
              {mean ? `k = ${mean.coverageFactor.toFixed(2)}, 95 %` : ''}
            </Text>
          </>
        ) : (
          <Text tone="ink2">No size yet.</Text>
        )}
      </View>
    </View>
  );
}
