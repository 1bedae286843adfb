import { useWatch, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { FieldPair } from '@/components/forms/FieldPair';
import { FormChoice } from '@/components/forms/FormChoice';
import { FormField } from '@/components/forms/FormField';
import { FormGroup } from '@/components/forms/FormGroup';
import { FormNumber } from '@/components/forms/FormNumber';
import type { Camera, Laser } from '@/shared/contracts/benches';
import { illuminationChoices, plainQuantity } from './benchWords';

export interface RevisionFieldsProps<V extends FieldValues, O> {
  control: Control<V, unknown, O>;
  /** Where the revision stands in the form: `` or `revision.`. */
  at: '' | 'revision.';
  lasers: readonly Laser[];
  cameras: readonly Camera[];
}

/** Laser, camera, distance and illumination of a bench. */
export function RevisionFields<V extends FieldValues, O>({ control, at, lasers, cameras }: RevisionFieldsProps<V, O>) {
  const name = (field: string) => `${at}${field}` as FieldPath<V>;
  const kind: unknown = useWatch({ control, name: name('illumination.kind') });
  return (
    <>
      <FormGroup title="On the bench">
        <FieldPair>
          <FormChoice
            control={control}
            name={name('laserId')}
            label="Laser"
            placeholder={lasers.length === 0 ? 'Add a laser first' : 'Choose the laser'}
            choices={lasers.map((laser) => ({
              value: laser.id,
              label: `${laser.name}, ${plainQuantity(laser.wavelengthNm, 'nm')}`,
            }))}
          />
          <FormChoice
            control={control}
            name={name('cameraId')}
            label="Camera"
            placeholder={cameras.length === 0 ? 'Add a camera first' : 'Choose the camera'}
            choices={cameras.map((camera) => ({ value: camera.id, label: camera.name }))}
          />
        </FieldPair>
      </FormGroup>
      <FormGroup
        title="Distance"
        note="From the aperture to the sensitive plane of the sensor. A cover glass is added from the camera’s record. In most laboratories this is the largest part of the uncertainty."
      >
        <FieldPair>
          <FormNumber control={control} name={name('distanceMm')} label="Distance" unit="mm" />
          <FormNumber
            control={control}
            name={name('distanceUncertaintyMm')}
            label="Standard uncertainty (k = 1)"
            unit="mm"
          />
        </FieldPair>
      </FormGroup>
      <FormGroup title="Illumination">
        <FieldPair>
          <FormChoice
            control={control}
            name={name('illumination.kind')}
            label="Light at the aperture"
            choices={illuminationChoices}
          />
          {kind === 'diverging' ? (
            <FormNumber
              control={control}
              name={name('illumination.sourceDistanceMm')}
              label="Source to aperture"
              unit="mm"
            />
          ) : null}
          {kind === 'gaussian' ? (
            <FormNumber
              control={control}
              name={name('illumination.beamRadiusUm')}
              label="Beam radius (1/e²) at the aperture"
              unit="µm"
            />
          ) : null}
        </FieldPair>
        <FormField
          control={control}
          name={name('note')}
          label="Note: what was changed, how the distance was measured"
          lines={2}
        />
      </FormGroup>
    </>
  );
}
