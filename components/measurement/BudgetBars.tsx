import { View } from 'react-native';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { fontFamily, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { BudgetLine } from '@/shared/contracts/measureResult';
import { formatNumber, formatPercent } from '@/shared/units/format';
import { placesOfUncertainty } from './placesOfUncertainty';
import { sourceName } from './words/sourceWords';

export interface BudgetBarsProps {
  budget: readonly BudgetLine[];
  standardUncertaintyUm: number;
  expandedUncertaintyUm: number;
  coverageFactor: number;
  effectiveDegreesOfFreedom: number | null;
}

/** What the largest cause makes of the whole, and what that means for the next frame. */
export function leadSentence(budget: readonly BudgetLine[], standardUncertaintyUm: number): string | null {
  const lead = [...budget].sort((a, b) => b.contributionUm - a.contributionUm)[0];
  if (!lead || standardUncertaintyUm <= 0) return null;
  const share = (lead.contributionUm / standardUncertaintyUm) ** 2;
  if (share < 0.5) return null;
  const words = `${sourceName(lead.source)} makes ${formatPercent(share, { significant: 2 })} of it.`;
  return lead.source === 'fit' || lead.source === 'repeat-frames' ? words : `${words} More frames change nothing here.`;
}

/** Contributions to the standard uncertainty by cause, sorted, the largest in accent. */
export function BudgetBars({
  budget,
  standardUncertaintyUm,
  expandedUncertaintyUm,
  coverageFactor,
  effectiveDegreesOfFreedom,
}: BudgetBarsProps) {
  const { colours, desk } = useLook();
  const lines = [...budget].sort((a, b) => b.contributionUm - a.contributionUm);
  const most = Math.max(lines[0]?.contributionUm ?? 0, 1e-12);
  const places = placesOfUncertainty(standardUncertaintyUm) + 1;
  const rowHeight = desk ? 22 : 26;
  const number = (value: number, decimals: number) => formatNumber(value, { places: decimals });
  const lead = leadSentence(budget, standardUncertaintyUm);
  return (
    <Section title="Uncertainty by cause" note="Standard uncertainty of the size, µm">
      <View role="list">
        {lines.map((line, i) => (
          <View
            key={line.source}
            role="listitem"
            style={{ height: rowHeight, flexDirection: 'row', alignItems: 'center' }}
          >
            <Text variant="small" style={{ width: desk ? 104 : 112 }}>
              {sourceName(line.source)}
            </Text>
            <View style={{ flex: 1, height: 10, backgroundColor: colours.wall }}>
              <View
                style={{
                  height: 10,
                  minWidth: 1.5,
                  width: `${(line.contributionUm / most) * 100}%`,
                  backgroundColor: i === 0 ? colours.accent : colours.ink2,
                }}
              />
            </View>
            <Text variant="small" align="right" style={{ width: desk ? 66 : 72 }}>
              {number(line.contributionUm, places)}
            </Text>
          </View>
        ))}
      </View>
      <View style={{ height: 1, backgroundColor: colours.ink3, marginTop: 4, marginBottom: 2 }} />
      <View
        style={{ flexDirection: 'row', justifyContent: 'space-between', minHeight: rowHeight, alignItems: 'center' }}
      >
        <Text variant="small">All together</Text>
        <Text variant="small">{number(standardUncertaintyUm, places)}</Text>
      </View>
      <View
        style={{ flexDirection: 'row', justifyContent: 'space-between', minHeight: rowHeight, alignItems: 'center' }}
      >
        <Text variant="small" tone="ink0" style={{ fontFamily: fontFamily.textBold }}>
          {`Times ${formatNumber(coverageFactor, { places: 2 })}, for 95 %`}
        </Text>
        <Text variant="small" tone="ink0" style={{ fontFamily: fontFamily.textBold }}>
          {number(expandedUncertaintyUm, placesOfUncertainty(expandedUncertaintyUm))}
        </Text>
      </View>
      <View style={{ marginTop: space.xs, gap: 2 }}>
        {lead ? (
          <Text variant="small" tone="ink2">
            {lead}
          </Text>
        ) : null}
        {effectiveDegreesOfFreedom === null ? null : (
          <Text variant="small" tone="ink2">
            {`Effective degrees of freedom: ${formatNumber(effectiveDegreesOfFreedom, { places: 0 })}.`}
          </Text>
        )}
      </View>
    </Section>
  );
}
