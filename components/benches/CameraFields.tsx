import type { Control } from 'react-hook-form';
import type { z } from 'zod';
import { FieldPair } from '@/components/forms/FieldPair';
import { FormField } from '@/components/forms/FormField';
import { FormGroup } from '@/components/forms/FormGroup';
import { FormNumber } from '@/components/forms/FormNumber';
import type { CameraBody, cameraBody } from '@/shared/contracts/benches';

/** A camera's record. What may stay empty is found from the frames. */
export function CameraFields({ control }: { control: Control<z.input<typeof cameraBody>, unknown, CameraBody> }) {
  return (
    <>
      <FieldPair>
        <FormField control={control} name="name" label="Name" />
        <FormField control={control} name="serial" label="Serial" autoCapitalize="characters" />
      </FieldPair>
      <FormGroup title="Pixels">
        <FieldPair>
          <FormNumber control={control} name="pixelPitchUm" label="Pixel pitch" unit="µm" />
          <FormNumber control={control} name="pixelPitchUncertaintyUm" label="Standard uncertainty (k = 1)" unit="µm" />
        </FieldPair>
        <FieldPair>
          <FormNumber control={control} name="widthPx" label="Width" unit="px" />
          <FormNumber control={control} name="heightPx" label="Height" unit="px" />
        </FieldPair>
        <FormNumber control={control} name="bitDepth" label="Significant bits" unit="bit" step={1} min={6} max={16} />
      </FormGroup>
      <FormGroup
        title="Counts"
        note="Leave empty what you do not know: it is then found from the frames, and the result says so."
      >
        <FieldPair>
          <FormNumber control={control} name="electronsPerCount" label="Gain" unit="e per count" />
          <FormNumber control={control} name="readNoiseElectrons" label="Read noise" unit="e" />
        </FieldPair>
        <FieldPair>
          <FormNumber control={control} name="blackCount" label="Black level" unit="counts" />
          <FormNumber control={control} name="whiteCount" label="White level" unit="counts" />
        </FieldPair>
      </FormGroup>
      <FormGroup title="Cover glass" note="Glass on the sensor lengthens the path. Empty or 0 where it is taken off.">
        <FieldPair>
          <FormNumber control={control} name="coverGlassMm" label="Thickness" unit="mm" />
          <FormNumber control={control} name="coverGlassIndex" label="Refractive index" />
        </FieldPair>
        <FormField control={control} name="note" label="Note" lines={2} />
      </FormGroup>
    </>
  );
}
