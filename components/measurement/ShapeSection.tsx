import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { Measured } from '@/shared/contracts/measureResult';
import { formatNumber } from '@/shared/units/format';
import { placesOfUncertainty } from './placesOfUncertainty';

/** Axes of a hole that is out of round; nothing where the engine found none. */
export function ShapeSection({ result }: { result: Measured }) {
  const axes = result.axesUm;
  if (axes === null) return null;
  const places = placesOfUncertainty(result.expandedUncertaintyUm ?? 0.01);
  const number = (value: number) => formatNumber(value, { places });
  return (
    <Section title="Shape">
      <Text variant="strong">{`Out of round by ${number(axes.major - axes.minor)} µm`}</Text>
      <Text variant="small">
        {`Longest ${number(axes.major)} µm at ${formatNumber(axes.angleDeg, { places: 0 })}°, shortest ${number(axes.minor)} µm. The size is their geometric mean.`}
      </Text>
    </Section>
  );
}
