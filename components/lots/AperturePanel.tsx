import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { HeroNumber } from '@/components/ui/HeroNumber';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Plate } from '@/components/ui/Plate';
import { Section } from '@/components/ui/Section';
import { Slot } from '@/components/ui/Slot';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { VerdictGlyph } from '@/components/ui/VerdictGlyph';
import type { Aperture } from '@/shared/contracts/lots';
import { formatMeasured, formatMeasuredText } from '@/shared/units/format';
import { apertureLimits, readAperture } from './apertureReading';
import { kindChoices, nominalText } from './apertureWords';

export interface AperturePanelProps {
  aperture: Aperture;
  /** May take frames. */
  mayCapture: boolean;
  /** May change the record. */
  mayEdit: boolean;
}

/** One piece of a lot: its newest size in its gap, its record, and the way on. */
export function AperturePanel({ aperture, mayCapture, mayEdit }: AperturePanelProps) {
  const reading = readAperture(aperture);
  const { newest } = aperture;
  const text = newest && newest.sizeUm !== null ? formatMeasured(newest.sizeUm, newest.expandedUncertaintyUm) : null;
  return (
    <View style={{ gap: space.hair }}>
      <Plate>
        {text && newest ? (
          <>
            <HeroNumber value={text.value} uncertainty={text.uncertainty ?? undefined} unit="µm" maxSize={72} />
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m, marginTop: space.m }}>
              <VerdictGlyph verdict={reading.verdict} scale={1.15} />
              <Text variant="strong">{reading.words.charAt(0).toUpperCase() + reading.words.slice(1)}</Text>
            </View>
            {aperture.toleranceUm === null ? null : (
              <Slot
                {...apertureLimits(aperture)}
                value={newest.sizeUm}
                uncertainty={newest.expandedUncertaintyUm}
                nominal={aperture.nominalSizeUm}
                size="lg"
                decimals={aperture.toleranceUm < 1 ? 2 : 1}
                label={`${formatMeasuredText(newest.sizeUm, newest.expandedUncertaintyUm, 'µm')}, ${reading.words}`}
                style={{ marginTop: space.s }}
              />
            )}
          </>
        ) : (
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
            <VerdictGlyph verdict={reading.verdict} scale={1.15} />
            <Text variant="strong" style={{ flex: 1 }}>
              {newest === null ? 'Not measured yet' : reading.words.charAt(0).toUpperCase() + reading.words.slice(1)}
            </Text>
          </View>
        )}
      </Plate>
      {newest ? (
        <Button
          label="Open the measurement"
          icon="rings"
          trailing="fwd"
          href={`/measurements/${newest.measurementId}`}
        />
      ) : null}
      {mayCapture ? (
        <Button
          label={newest === null ? 'Take frames' : 'Take frames again'}
          kind={newest === null ? 'primary' : 'plain'}
          icon="capture"
          trailing="fwd"
          href={`/capture?aperture=${aperture.id}`}
        />
      ) : null}
      <Section title="Record">
        <KeyValueList
          entries={[
            ['Kind', kindChoices.find((choice) => choice.value === aperture.kind)?.label ?? aperture.kind],
            ['Nominal size', nominalText(aperture.nominalSizeUm, null)],
            [
              'Tolerance',
              aperture.toleranceUm === null ? 'none agreed' : `± ${nominalText(aperture.toleranceUm, null)}`,
            ],
            ['Lot', aperture.lotNumber],
            ...(aperture.note ? [['Note', aperture.note] as const] : []),
          ]}
        />
      </Section>
      {mayEdit ? (
        <Button
          label="Change the record"
          icon="note"
          kind="quiet"
          href={`/lots/${aperture.lotId}/apertures/${aperture.id}`}
        />
      ) : null}
    </View>
  );
}
