import { useState } from 'react';
import { View } from 'react-native';
import { Plate } from '@/components/ui/Plate';
import { Text } from '@/components/ui/Text';
import { space, stroke } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import { ViewSwitch } from '@/components/ui/ViewSwitch';
import type { Ring } from '@/shared/contracts/measureResult';
import { formatMeasured, formatNumber } from '@/shared/units/format';
import { placesOfUncertainty } from './placesOfUncertainty';

export interface RingTableProps {
  rings: readonly Ring[];
  /** Sizes end on the place on which the stated size ends. */
  expandedUncertaintyUm: number | null;
  /** Dark ring that is chosen here, in the frame and in the profile alike. */
  chosenOrder: number | null;
  onChooseRing?: (order: number | null) => void;
  /** Said below the table. */
  foot?: string;
}

/** Each ring: measured radius with its uncertainty, the model's radius, and the size that this ring alone gives. */
export function RingTable({ rings, expandedUncertaintyUm, chosenOrder, onChooseRing, foot }: RingTableProps) {
  const { colours, layout } = useLook();
  const [kind, setKind] = useState<Ring['kind']>('dark');
  const bright = rings.some((ring) => ring.kind === 'bright');
  const shown = rings.filter((ring) => ring.kind === kind);
  const phone = layout === 'phone';
  const places = placesOfUncertainty(expandedUncertaintyUm ?? 0.01);
  const cell = (text: string, flex: number, tone: 'ink0' | 'ink1' | 'ink2' = 'ink1', label = false) => (
    <View role={label ? 'columnheader' : 'cell'} style={{ flex, minWidth: 0 }}>
      <Text variant={label ? 'label' : 'small'} tone={tone} align="right" lines={1}>
        {text}
      </Text>
    </View>
  );
  const line = { flexDirection: 'row' as const, gap: space.s, alignItems: 'center' as const };
  return (
    <Plate>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m, marginBottom: space.xs }}>
        <Text variant={phone ? 'title' : 'section'} level={2} style={{ flex: 1 }}>
          Ring table
        </Text>
        {bright ? (
          <ViewSwitch
            label="Kind of ring"
            views={[
              { value: 'dark', label: 'Dark' },
              { value: 'bright', label: 'Bright' },
            ]}
            value={kind}
            onChange={setKind}
          />
        ) : null}
      </View>
      <View role="table" aria-label={`${kind === 'dark' ? 'Dark' : 'Bright'} rings`}>
        <View role="row" style={[line, { paddingVertical: 6 }]}>
          <View role="columnheader" style={{ width: 44 }}>
            <Text variant="label">Ring</Text>
          </View>
          {cell('Radius, mm', 1.15, 'ink2', true)}
          {cell('±', 1, 'ink2', true)}
          {cell('Model', 1.1, 'ink2', true)}
          {cell('Size, µm', 1.1, 'ink2', true)}
        </View>
        {shown.map((ring) => {
          const radius = formatMeasured(ring.radiusMm, ring.uncertaintyMm);
          const decimals = placesOfUncertainty(ring.uncertaintyMm);
          const chosen = kind === 'dark' && ring.order === chosenOrder;
          const cells = (
            <>
              {chosen ? (
                <View
                  style={{
                    position: 'absolute',
                    left: -8,
                    top: 0,
                    bottom: 0,
                    width: stroke.bar,
                    backgroundColor: colours.accent,
                  }}
                />
              ) : null}
              <View role="cell" style={{ width: 44 }}>
                <Text variant="small" tone={chosen ? 'ink0' : 'ink1'}>
                  {ring.order}
                </Text>
              </View>
              {cell(radius.value, 1.15)}
              {cell(radius.uncertainty ?? '–', 1, 'ink2')}
              {cell(formatNumber(ring.predictedMm, { places: decimals }), 1.1)}
              {cell(formatNumber(ring.sizeUm, { places }), 1.1, 'ink0')}
            </>
          );
          const frame = [line, { minHeight: phone ? 36 : 30, backgroundColor: chosen ? colours.lift : undefined }];
          if (kind !== 'dark' || !onChooseRing) {
            return (
              <View key={`${ring.kind}${ring.order}`} role="row" style={frame}>
                {cells}
              </View>
            );
          }
          return (
            <Touch
              key={`${ring.kind}${ring.order}`}
              role="row"
              selected={chosen}
              label={`Dark ring ${ring.order}, radius ${radius.value} mm, size ${formatNumber(ring.sizeUm, { places })} µm`}
              onPress={() => onChooseRing(chosen ? null : ring.order)}
              style={frame}
            >
              {cells}
            </Touch>
          );
        })}
        {shown.length === 0 ? (
          <Text variant="small" tone="ink2">
            No ring of this kind was measured.
          </Text>
        ) : null}
      </View>
      {foot ? (
        <View style={{ borderTopWidth: 1, borderTopColor: colours.rule, paddingTop: space.s, marginTop: space.xs }}>
          <Text variant="small" tone="ink2">
            {foot}
          </Text>
        </View>
      ) : null}
    </Plate>
  );
}
