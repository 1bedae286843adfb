import { KeyValueList } from '@/components/ui/KeyValueList';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { Compared } from '@/shared/contracts/measurements';
import { formatMeasuredText, formatNumber, formatPercent } from '@/shared/units/format';
import type { CompareLineResult, SizeBasis } from './compareLine';

export interface LineFactsProps {
  line: CompareLineResult;
  chosen: readonly Compared[];
  basis: SizeBasis;
}

/** What the straight line is, in numbers. */
export function LineFacts({ line, chosen, basis }: LineFactsProps) {
  const { fit } = line;
  const first = chosen[0];
  if (!fit || !first) return null;
  const assumed = (first.wavelengthNm / 1000) * first.distanceMm;
  const used = line.points.filter((point) => !point.leftOut).length;
  return (
    <Section title="The line">
      <KeyValueList
        entries={[
          ['Slope, λz', formatMeasuredText(fit.slope, fit.slopeUncertainty, 'µm·mm')],
          ['Bench says λz', `${formatNumber(assumed, { significant: 6 })} µm·mm`],
          ['They differ by', formatPercent((fit.slope - assumed) / assumed, { significant: 2 })],
          [
            'Meets 1/size = 0 at',
            formatMeasuredText(
              fit.intercept * 1000,
              fit.interceptUncertainty === null ? null : fit.interceptUncertainty * 1000,
              'µm',
            ),
          ],
          ['Errors in', basis === 'measured' ? 'size and radius' : 'radius, from the scatter'],
          ['Radii used', `${used} of ${line.points.length}`],
          ...(basis === 'measured' && fit.reducedChiSquare !== null
            ? ([['Fit', `${formatNumber(fit.reducedChiSquare, { places: 2 })}, expected 1.00`]] as const)
            : []),
        ]}
      />
      <Text variant="small" tone="ink2" style={{ marginTop: 8 }}>
        Each radius is divided by the factor of its dark ring (1.220, 2.233, 3.238 and so on) and taken as the sine of
        its angle, so that all rings share one line. Uncertainties are standard uncertainties, k = 1.
      </Text>
    </Section>
  );
}
