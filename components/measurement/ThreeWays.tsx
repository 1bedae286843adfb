import { useId, useState } from 'react';
import { View } from 'react-native';
import Svg, { Defs, Path, Rect } from 'react-native-svg';
import { HatchPattern } from '@/components/ui/HatchPattern';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import type { Measured } from '@/shared/contracts/measureResult';
import { formatMeasuredText, formatNumber } from '@/shared/units/format';
import { placesOfUncertainty } from './placesOfUncertainty';

interface Way {
  name: string;
  sizeUm: number | null;
  uncertaintyUm: number | null;
  /** Why there is none. */
  reason: string | null;
}

/** The three ways to the size, each with its own standard uncertainty. */
export function waysOf(result: Measured): Way[] {
  return [
    { name: 'Whole pattern', sizeUm: result.sizeUm, uncertaintyUm: result.fitUncertaintyUm, reason: null },
    {
      name: 'Dark rings',
      sizeUm: result.ringSizeUm,
      uncertaintyUm: result.ringSizeUncertaintyUm,
      reason: 'too few dark rings',
    },
    {
      name: 'Transform',
      sizeUm: result.secondOpinion.sizeUm,
      uncertaintyUm: result.secondOpinion.standardUncertaintyUm,
      reason: result.secondOpinion.reason,
    },
  ];
}

/** What the three say of each other, in one sentence; null where there is only one. */
export function agreement(ways: readonly Way[], sizeUm: number, expandedUncertaintyUm: number): string | null {
  const others = ways.slice(1).filter((way) => way.sizeUm !== null);
  if (others.length === 0) return null;
  const off = others.filter((way) => Math.abs((way.sizeUm ?? sizeUm) - sizeUm) > expandedUncertaintyUm);
  if (off.length > 0) {
    const one = off[0];
    const apart = formatNumber(Math.abs((one?.sizeUm ?? sizeUm) - sizeUm), { significant: 2 });
    const explained = (one?.uncertaintyUm ?? 0) * 2 >= Math.abs((one?.sizeUm ?? sizeUm) - sizeUm);
    return `${one?.name ?? ''} lies ${apart} µm off, outside the stated uncertainty${explained ? ', but within twice its own' : ''}.`;
  }
  return `${others.length === 2 ? 'All three' : 'Both'} lie within the stated uncertainty.`;
}

/** Reach of the drawing on either side, in expanded uncertainties. */
const REACH = 1.55;

/** Size by whole pattern, by dark rings and by transform, in the slot of the stated uncertainty. */
export function ThreeWays({ result }: { result: Measured }) {
  const { colours, desk } = useLook();
  const [width, setWidth] = useState(0);
  const id = `ways${useId().replace(/\W/g, '')}`;
  const { sizeUm, expandedUncertaintyUm } = result;
  if (sizeUm === null || expandedUncertaintyUm === null || expandedUncertaintyUm <= 0) return null;
  const ways = waysOf(result);
  const rowHeight = desk ? 28 : 34;
  const height = ways.length * rowHeight;
  const places = placesOfUncertainty(expandedUncertaintyUm);
  const x = (value: number) => {
    const part = (value - sizeUm) / expandedUncertaintyUm / REACH;
    return (Math.max(-1, Math.min(1, part)) * 0.5 + 0.5) * width;
  };
  const [low, high] = [sizeUm - expandedUncertaintyUm, sizeUm + expandedUncertaintyUm];
  const labelWidth = desk ? 100 : 108;
  const numberWidth = desk ? 62 : 68;
  const said = agreement(ways, sizeUm, expandedUncertaintyUm);
  return (
    <Section title="Three ways to the size">
      <View style={{ flexDirection: 'row' }}>
        <View style={{ width: labelWidth }}>
          {ways.map((way) => (
            <View key={way.name} style={{ height: rowHeight, justifyContent: 'center' }}>
              <Text variant="small">{way.name}</Text>
            </View>
          ))}
        </View>
        <View
          style={{ flex: 1, height }}
          role="img"
          aria-label={ways
            .map(
              (way) =>
                `${way.name}: ${way.sizeUm === null ? `none, ${way.reason ?? 'not to be had'}` : formatMeasuredText(way.sizeUm, way.uncertaintyUm, 'µm')}`,
            )
            .join('; ')}
          onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
        >
          {width > 0 ? (
            <Svg width={width} height={height} aria-hidden>
              <Defs>
                <HatchPattern id={id} step={5} line={1} angleDeg={45} colour={colours.hatch} />
              </Defs>
              <Rect x={0} y={0} width={x(low)} height={height} fill={`url(#${id})`} opacity={0.6} />
              <Rect x={x(high)} y={0} width={width - x(high)} height={height} fill={`url(#${id})`} opacity={0.6} />
              <Rect x={x(low)} y={0} width={x(high) - x(low)} height={height} fill={colours.slotGap} />
              <Path d={`M${x(low)} 0V${height}M${x(high)} 0V${height}`} stroke={colours.ink2} strokeWidth={1.25} />
              {ways.map((way, i) => {
                if (way.sizeUm === null) return null;
                const y = (i + 0.5) * rowHeight;
                const at = Math.min(width - 1.5, Math.max(1.5, x(way.sizeUm)));
                const u = 2 * (way.uncertaintyUm ?? 0);
                return [
                  <Path
                    key={`${way.name} bar`}
                    d={`M${x(way.sizeUm - u)} ${y}H${x(way.sizeUm + u)}`}
                    stroke={i === 0 ? colours.accent : colours.ink1}
                    strokeWidth={2}
                  />,
                  <Path
                    key={`${way.name} mark`}
                    d={`M${at} ${y - 8}v16`}
                    stroke={i === 0 ? colours.accent : colours.ink0}
                    strokeWidth={3}
                  />,
                ];
              })}
            </Svg>
          ) : null}
        </View>
        <View style={{ width: numberWidth }}>
          {ways.map((way) => (
            <View key={way.name} style={{ height: rowHeight, justifyContent: 'center', alignItems: 'flex-end' }}>
              <Text variant="small" tone={way.sizeUm === null ? 'ink2' : 'ink1'}>
                {way.sizeUm === null ? 'none' : formatNumber(way.sizeUm, { places })}
              </Text>
            </View>
          ))}
        </View>
      </View>
      <View style={{ flexDirection: 'row', marginLeft: labelWidth, marginRight: numberWidth, height: 22 }}>
        {width > 0
          ? [low, high].map((limit) => (
              <Text
                key={limit}
                variant="label"
                align="center"
                style={{ position: 'absolute', top: 4, width: 80, left: x(limit) - 40 }}
              >
                {formatNumber(limit, { places })}
              </Text>
            ))
          : null}
      </View>
      {ways.map((way) =>
        way.sizeUm === null ? (
          <Text key={way.name} variant="small" tone="ink2">
            {`${way.name}: none. ${way.reason ?? 'It is not to be had from this frame.'}`}
          </Text>
        ) : null,
      )}
      {said ? (
        <Text variant="small" tone="ink2" style={{ marginTop: 4 }}>
          {said}
        </Text>
      ) : null}
    </Section>
  );
}
