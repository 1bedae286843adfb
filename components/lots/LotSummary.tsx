import { View } from 'react-native';
import { Plate } from '@/components/ui/Plate';
import { Slot } from '@/components/ui/Slot';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { VerdictGlyph, type Verdict } from '@/components/ui/VerdictGlyph';
import type { Aperture } from '@/shared/contracts/lots';
import { formatNumber, THIN_SPACE } from '@/shared/units/format';
import { apertureLimits, readAperture } from './apertureReading';

/** How the sizes of a lot lie between the limits: counts, and every piece in one slot. */
export function LotSummary({ apertures }: { apertures: readonly Aperture[] }) {
  const { desk } = useLook();
  const readings = apertures.map((aperture) => ({ aperture, reading: readAperture(aperture) }));
  const count = (...verdicts: Verdict[]) => readings.filter(({ reading }) => verdicts.includes(reading.verdict)).length;
  const counts = [
    { verdict: 'conforms' as const, count: count('conforms'), words: desk ? 'within limits' : 'within' },
    { verdict: 'undecided' as const, count: count('undecided'), words: desk ? 'at a limit' : 'at limit' },
    { verdict: 'above' as const, count: count('above', 'below'), words: 'outside' },
    { verdict: 'refused' as const, count: count('refused'), words: 'refused' },
    { verdict: 'open' as const, count: count('open'), words: 'open' },
  ];
  const sizes = readings.flatMap(({ aperture, reading }) =>
    aperture.newest !== null && aperture.newest.sizeUm !== null
      ? [{ value: aperture.newest.sizeUm, odd: reading.toLookAt }]
      : [],
  );
  const first = apertures[0];
  const alike =
    first !== undefined &&
    first.toleranceUm !== null &&
    apertures.every((one) => one.nominalSizeUm === first.nominalSizeUm && one.toleranceUm === first.toleranceUm);
  const mean = sizes.reduce((sum, one) => sum + one.value, 0) / sizes.length;
  const spread =
    sizes.length > 1
      ? Math.sqrt(sizes.reduce((sum, one) => sum + (one.value - mean) ** 2, 0) / (sizes.length - 1))
      : null;
  return (
    <Plate padding="none">
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          gap: desk ? 22 : space.xs,
          rowGap: space.s,
          paddingHorizontal: desk ? 20 : space.l,
          paddingTop: 12,
          paddingBottom: 4,
          alignItems: 'center',
        }}
      >
        {counts.map((one) => (
          <View
            key={one.verdict}
            style={desk ? { flexDirection: 'row', alignItems: 'center', gap: 9 } : { flex: 1, minWidth: 60 }}
          >
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
              <VerdictGlyph verdict={one.verdict} />
              <Text variant="medium" tone={one.count === 0 ? 'ink2' : 'ink0'}>
                {one.count}
              </Text>
            </View>
            <Text variant={desk ? 'body' : 'label'} tone={desk ? 'ink1' : 'ink2'}>
              {one.words}
            </Text>
          </View>
        ))}
        {alike && spread !== null ? (
          <Text variant={desk ? 'body' : 'small'} tone="ink2" style={desk ? { marginLeft: 'auto' } : { width: '100%' }}>
            {`mean ${formatNumber(mean, { places: 2 })}, scatter ${formatNumber(spread, { places: 2 })}${THIN_SPACE}µm`}
          </Text>
        ) : null}
      </View>
      {alike && sizes.length > 0 ? (
        <Slot
          {...apertureLimits(first)}
          nominal={first.nominalSizeUm}
          marks={sizes}
          size="lg"
          decimals={first.toleranceUm !== null && first.toleranceUm < 1 ? 2 : 1}
          label={`${sizes.length} sizes between the limits ${formatNumber(first.nominalSizeUm - (first.toleranceUm ?? 0), { places: 2 })} and ${formatNumber(first.nominalSizeUm + (first.toleranceUm ?? 0), { places: 2 })} µm`}
        />
      ) : (
        <View style={{ height: space.s }} />
      )}
    </Plate>
  );
}
