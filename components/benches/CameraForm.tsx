import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { FormFrame } from '@/components/forms/FormFrame';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { Caution } from '@/components/ui/Caution';
import { Screen, type ScreenSide } from '@/components/ui/Screen';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { cameraBody, type Camera, type CameraBody } from '@/shared/contracts/benches';
import { cameraCaution } from './benchWords';
import { CameraFields } from './CameraFields';

export interface CameraFormProps {
  /** Null: a new one. */
  camera: Camera | null;
  list: ScreenSide;
  onSave: (body: CameraBody) => Promise<void>;
}

const nothingKnown = {
  electronsPerCount: null,
  readNoiseElectrons: null,
  blackCount: null,
  whiteCount: null,
  coverGlassMm: null,
  coverGlassIndex: null,
};

/** A camera to be added or changed. */
export function CameraForm({ camera, list, onSave }: CameraFormProps) {
  const form = useForm<z.input<typeof cameraBody>, unknown, CameraBody>({
    resolver: zodResolver(cameraBody),
    defaultValues: camera ?? { name: '', serial: '', bitDepth: 12, note: '', ...nothingKnown },
  });
  const draft = useDraft(camera ? `camera.${camera.id}` : 'camera.new', form);
  const { submit, busy, problem } = useSubmit(form, onSave, draft.saved);
  return (
    <Screen
      title={camera ? camera.name : 'New camera'}
      subtitle={camera ? 'Measurements keep the values that they used' : undefined}
      back="/bench"
      list={list}
      measure={720}
      foot={
        <SaveFoot label={camera ? 'Save the camera' : 'Add the camera'} busy={busy} onSave={submit} cancel="/bench" />
      }
    >
      <FormFrame problem={problem} problemTitle="The camera is not saved." draft={draft}>
        <CameraFields control={form.control} />
      </FormFrame>
      <Caution>{cameraCaution}</Caution>
    </Screen>
  );
}
