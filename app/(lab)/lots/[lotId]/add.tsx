import { zodResolver } from '@hookform/resolvers/zod';
import { router, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import { FormFrame } from '@/components/forms/FormFrame';
import { FormNumber } from '@/components/forms/FormNumber';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { ApertureFields } from '@/components/lots/ApertureFields';
import { SeriesPreview } from '@/components/lots/SeriesPreview';
import { seriesApertures, seriesSchema, type Series, type SeriesInput } from '@/components/lots/seriesForm';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Screen } from '@/components/ui/Screen';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useAddApertures, useLot } from '@/hooks/queries/lots';

export default function AddAperturesScreen() {
  const { lotId } = useLocalSearchParams<{ lotId: string }>();
  const lot = useLot(lotId);
  const add = useAddApertures(lotId);
  const { light } = useChosenBench();
  const { say } = useNotice();
  const form = useForm<SeriesInput, unknown, Series>({
    resolver: zodResolver(seriesSchema),
    defaultValues: { serial: '', count: 1, kind: 'pinhole', toleranceUm: null, note: '' },
  });
  const draft = useDraft(`lot.${lotId}.add`, form);
  const { submit, busy, problem } = useSubmit(
    form,
    (series) => add.mutateAsync({ apertures: seriesApertures(series) }),
    () => {
      draft.saved();
      say(form.getValues('count') === 1 ? 'One piece is added.' : `${form.getValues('count')} pieces are added.`);
      router.replace(`/lots/${lotId}`);
    },
  );
  const [serial, count] = form.watch(['serial', 'count']);
  return (
    <Screen
      title="Add pieces"
      subtitle={lot.data ? `Lot ${lot.data.number}, ${lot.data.clientName}` : undefined}
      back={`/lots/${lotId}`}
      measure={720}
      foot={
        <SaveFoot
          label={count > 1 ? `Add ${count} pieces` : 'Add the piece'}
          busy={busy}
          onSave={submit}
          cancel={`/lots/${lotId}`}
        />
      }
      {...light}
    >
      <FormFrame problem={problem} problemTitle="No piece is added." draft={draft}>
        <FormNumber control={form.control} name="count" label="How many alike" step={1} min={1} max={500} />
        <ApertureFields
          control={form.control}
          serialLabel={count > 1 ? 'Serial of the first' : 'Serial'}
          serialHint={count > 1 ? 'Its last digits count up: PO-150-01, PO-150-02 and so on.' : undefined}
        />
      </FormFrame>
      <SeriesPreview serial={serial} count={count} />
    </Screen>
  );
}
