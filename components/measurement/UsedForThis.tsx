import { KeyValueList } from '@/components/ui/KeyValueList';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import type { Illumination } from '@/shared/contracts/benches';
import { formatMeasuredText, formatNumber } from '@/shared/units/format';
import { asEntered } from './asEntered';

/** The light on the aperture, in words. */
export function illuminationWords(illumination: Illumination): string {
  switch (illumination.kind) {
    case 'plane':
      return 'Plane wave';
    case 'diverging':
      return `Diverging, source at ${asEntered(illumination.sourceDistanceMm)} mm`;
    case 'gaussian':
      return `Gaussian, radius ${asEntered(illumination.beamRadiusUm)} µm`;
  }
}

const modelNames: Record<string, string> = {
  airy: 'Round hole, far field',
  lommel: 'Round hole, near and far field',
};

/** Everything the number rests on, as it was when it was measured. */
export function UsedForThis({ measurement }: { measurement: MeasurementDetail }) {
  const { inputs, result, settings } = measurement;
  const given = inputs.uncertainty ?? {};
  const measured = result?.status === 'measured' ? result : null;
  const glass = inputs.camera.coverGlassMm ?? 0;
  const entries: [string, string][] = [
    ['Bench', `${measurement.benchName}, revision ${measurement.benchRevision}`],
    ['Laser', measurement.laserName],
    ['Wavelength in air', formatMeasuredText(inputs.wavelengthNm, given.wavelengthNm, 'nm')],
    ['Distance', formatMeasuredText(inputs.distanceMm, given.distanceMm, 'mm')],
    ['Illumination', illuminationWords(inputs.illumination)],
    ['Camera', measurement.cameraName],
    ['Pixel pitch', formatMeasuredText(inputs.pixelPitchUm, given.pixelPitchUm, 'µm')],
    ...(glass > 0
      ? [
          ['Cover glass', `${asEntered(glass)} mm, index ${asEntered(inputs.camera.coverGlassIndex ?? 1.5)}`] as [
            string,
            string,
          ],
        ]
      : []),
    ['Darks', settings.useDarks ? (measurement.darkCount === 0 ? 'None' : String(measurement.darkCount)) : 'Not used'],
    ...(measured
      ? [
          ['Model', modelNames[measured.model] ?? measured.model] as [string, string],
          ...(measured.reducedChiSquare === null
            ? []
            : [
                ['Fit', `${formatNumber(measured.reducedChiSquare, { places: 2 })}, expected 1.00`] as [string, string],
              ]),
          ...(measured.fresnelNumber === null
            ? []
            : [['Fresnel number', formatNumber(measured.fresnelNumber, { significant: 2 })] as [string, string]]),
        ]
      : []),
    ...(result && result.status !== 'failed' ? [['Engine', result.engine] as [string, string]] : []),
    ['Frame', measurement.frameName],
  ];
  return (
    <Section
      title={measured ? 'Used for this number' : 'Used for this run'}
      note="Uncertainties are standard uncertainties, k = 1"
    >
      <KeyValueList entries={entries} />
      {measured && measured.assumed.length > 0 ? (
        <Text variant="small" tone="ink2" style={{ marginTop: 8 }}>
          {`Found out or assumed: ${measured.assumed.join(' ')}`}
        </Text>
      ) : null}
    </Section>
  );
}
