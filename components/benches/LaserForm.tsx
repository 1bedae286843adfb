import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { FormFrame } from '@/components/forms/FormFrame';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { Caution } from '@/components/ui/Caution';
import { Screen, type ScreenSide } from '@/components/ui/Screen';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { laserBody, type Laser, type LaserBody } from '@/shared/contracts/benches';
import { laserCaution } from './benchWords';
import { LaserFields } from './LaserFields';

export interface LaserFormProps {
  /** Null: a new one. */
  laser: Laser | null;
  list: ScreenSide;
  onSave: (body: LaserBody) => Promise<void>;
}

/** A laser to be added or changed. */
export function LaserForm({ laser, list, onSave }: LaserFormProps) {
  const form = useForm<z.input<typeof laserBody>, unknown, LaserBody>({
    resolver: zodResolver(laserBody),
    defaultValues: laser ?? { name: '', serial: '', powerMw: null, note: '' },
  });
  const draft = useDraft(laser ? `laser.${laser.id}` : 'laser.new', form);
  const { submit, busy, problem } = useSubmit(form, onSave, draft.saved);
  const laserClass = form.watch('laserClass');
  return (
    <Screen
      title={laser ? laser.name : 'New laser'}
      subtitle={laser ? 'Measurements keep the values that they used' : undefined}
      back="/bench"
      list={list}
      measure={720}
      wavelengthNm={laser?.wavelengthNm ?? null}
      foot={<SaveFoot label={laser ? 'Save the laser' : 'Add the laser'} busy={busy} onSave={submit} cancel="/bench" />}
    >
      <FormFrame problem={problem} problemTitle="The laser is not saved." draft={draft}>
        <LaserFields control={form.control} />
      </FormFrame>
      {laserClass ? <Caution icon="eyewear">{laserCaution(laserClass)}</Caution> : null}
    </Screen>
  );
}
