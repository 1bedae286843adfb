import { useState } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { fontFamily, radius } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import { webProps } from '@/components/ui/webProps';
import type { Ring } from '@/shared/contracts/measureResult';
import { placesOfUncertainty } from '@/components/measurement/placesOfUncertainty';
import { formatNumber } from '@/shared/units/format';
import type { MeasuredFrame } from './SheetScene';

interface Props {
  dark: readonly Ring[];
  measured: MeasuredFrame;
  /** Middle of each row, px from the top of the sheet, by order. */
  rowYs: ReadonlyMap<number, number>;
  /** Height of the head, which stands above the sheet, px. */
  headPx: number;
  chosenOrder: number | null;
  onChoose: (order: number | null) => void;
}

const columns = [
  { title: 'Dark ring', flex: 0.75 },
  { title: 'Radius, mm', flex: 1.1 },
  { title: '±', flex: 0.85 },
  { title: 'Size, µm', flex: 1.1 },
] as const;
const gridCell = webProps({ role: 'gridcell' });

/** Middle of the sorted values: one odd ring does not decide for the column. */
function middle(places: readonly number[]): number {
  return [...places].sort((a, b) => a - b)[Math.floor(places.length / 2)] ?? 0;
}

/** The ring table of the projection sheet: each row stands where its ring's plumb arrives. */
export function DeskRingTable({ dark, measured, rowYs, headPx, chosenOrder, onChoose }: Props) {
  const { colours } = useLook();
  const [width, setWidth] = useState(0);
  const ys = [...rowYs.values()].sort((a, b) => a - b);
  const gap = ys.length > 1 ? Math.min(...ys.slice(1).map((y, i) => y - ys[i]!)) : 56;
  const rowHeight = Math.max(20, Math.min(56, gap - 2));
  const size = rowHeight >= 36 && width >= 430 ? 20 : 15;
  // One number of decimals for a column, so that its points stand under each other.
  const radiusPlaces = middle(dark.map((r) => placesOfUncertainty(r.uncertaintyMm)));
  const sizePlaces = middle(dark.map((r) => placesOfUncertainty((r.sizeUm * r.uncertaintyMm) / r.radiusMm)));
  const cell = (flex: number, i: number) => ({
    flex,
    alignItems: i === 0 ? ('flex-start' as const) : ('flex-end' as const),
  });
  return (
    <View
      onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}
      style={{ flex: 1, backgroundColor: colours.plate, borderRadius: radius.plate, overflow: 'hidden' }}
    >
      <View role="grid" aria-label="Dark rings" style={{ flex: 1 }}>
        <View
          role="row"
          style={{ height: headPx - 2, flexDirection: 'row', alignItems: 'center', paddingLeft: 20, paddingRight: 16 }}
        >
          {columns.map((column, i) => (
            <View key={column.title} role="columnheader" style={cell(column.flex, i)}>
              <Text variant="label">{column.title}</Text>
            </View>
          ))}
        </View>
        <View role="rowgroup" style={{ position: 'absolute', left: 0, right: 0, top: headPx, bottom: 0 }}>
          {dark.map((ring) => {
            const y = rowYs.get(ring.order);
            if (y === undefined) return null;
            const chosen = ring.order === chosenOrder;
            const radiusText = formatNumber(ring.radiusMm, { places: radiusPlaces });
            const errorText = formatNumber(ring.uncertaintyMm, { places: radiusPlaces });
            const sizeText = formatNumber(ring.sizeUm, { places: sizePlaces });
            const figure = { fontFamily: fontFamily.figure, fontSize: size, lineHeight: size + 4, color: colours.ink0 };
            return (
              <Touch
                key={ring.order}
                role="row"
                selected={chosen}
                onPress={() => onChoose(chosen ? null : ring.order)}
                style={({ pressed }) => ({
                  position: 'absolute',
                  left: 0,
                  right: 0,
                  top: y - rowHeight / 2,
                  height: rowHeight,
                  flexDirection: 'row',
                  alignItems: 'center',
                  paddingLeft: 20,
                  paddingRight: 16,
                  backgroundColor: chosen || pressed ? colours.lift : 'transparent',
                })}
              >
                <View {...gridCell} style={cell(columns[0].flex, 0)}>
                  <Text variant={chosen ? 'strong' : 'body'} tone="ink0">
                    {String(ring.order)}
                  </Text>
                </View>
                <View {...gridCell} style={cell(columns[1].flex, 1)}>
                  <Text style={figure}>{radiusText}</Text>
                </View>
                <View {...gridCell} style={cell(columns[2].flex, 2)}>
                  <Text>{errorText}</Text>
                </View>
                <View {...gridCell} style={cell(columns[3].flex, 3)}>
                  <Text style={figure}>{sizeText}</Text>
                </View>
              </Touch>
            );
          })}
        </View>
      </View>
      <View style={{ position: 'absolute', left: 20, right: 16, bottom: 12 }}>
        <Text variant="small" tone="ink2">
          {`Centre ${formatNumber(measured.centrePx.x, { places: 2 })}, ${formatNumber(measured.centrePx.y, { places: 2 })} px`}
        </Text>
      </View>
    </View>
  );
}
