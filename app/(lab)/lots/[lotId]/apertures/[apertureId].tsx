import { zodResolver } from '@hookform/resolvers/zod';
import { router, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { FormFrame } from '@/components/forms/FormFrame';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { ApertureFields } from '@/components/lots/ApertureFields';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Screen } from '@/components/ui/Screen';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useAperture } from '@/hooks/queries/apertures';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useUpdateAperture } from '@/hooks/queries/lots';
import { apertureBody, type Aperture, type ApertureBody } from '@/shared/contracts/lots';

export default function EditApertureScreen() {
  const { lotId, apertureId } = useLocalSearchParams<{ lotId: string; apertureId: string }>();
  const aperture = useAperture(apertureId);
  return (
    <AwaitedScreen result={aperture} what="the aperture" title="Change the record" back={`/lots/${lotId}`}>
      {(data) => <EditAperture aperture={data} lotId={lotId} />}
    </AwaitedScreen>
  );
}

function EditAperture({ aperture, lotId }: { aperture: Aperture; lotId: string }) {
  const update = useUpdateAperture(aperture.id);
  const { light } = useChosenBench();
  const { say } = useNotice();
  const back = `/lots/${lotId}?aperture=${aperture.id}` as const;
  const { serial, kind, nominalSizeUm, toleranceUm, note } = aperture;
  const form = useForm<z.input<typeof apertureBody>, unknown, ApertureBody>({
    resolver: zodResolver(apertureBody),
    defaultValues: { serial, kind, nominalSizeUm, toleranceUm, note },
  });
  const draft = useDraft(`aperture.${aperture.id}`, form);
  const { submit, busy, problem } = useSubmit(
    form,
    (body) => update.mutateAsync(body),
    () => {
      draft.saved();
      say('The record is saved.');
      router.replace(back);
    },
  );
  return (
    <Screen
      title={`Change ${aperture.serial}`}
      subtitle={`Lot ${aperture.lotNumber}`}
      back={back}
      measure={720}
      foot={<SaveFoot label="Save the record" busy={busy} onSave={submit} cancel={back} />}
      {...light}
    >
      <FormFrame problem={problem} problemTitle="The record is not saved." draft={draft}>
        <ApertureFields control={form.control} serialLabel="Serial" />
      </FormFrame>
    </Screen>
  );
}
