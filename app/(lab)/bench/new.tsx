import { zodResolver } from '@hookform/resolvers/zod';
import { router } from 'expo-router';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { benchSide } from '@/components/benches/benchSide';
import { RevisionFields } from '@/components/benches/RevisionFields';
import { FormField } from '@/components/forms/FormField';
import { FormFrame } from '@/components/forms/FormFrame';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Screen } from '@/components/ui/Screen';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useCreateBench } from '@/hooks/queries/benches';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';
import { benchBody, type BenchBody } from '@/shared/contracts/benches';

export default function NewBenchScreen() {
  const equipment = useEquipment();
  const mayEdit = useRole() === 'manager';
  const create = useCreateBench();
  const { say } = useNotice();
  const form = useForm<z.input<typeof benchBody>, unknown, BenchBody>({
    resolver: zodResolver(benchBody),
    defaultValues: { name: '', revision: { laserId: '', cameraId: '', illumination: { kind: 'plane' }, note: '' } },
  });
  const draft = useDraft('bench.new', form);
  const { submit, busy, problem } = useSubmit(
    form,
    (body) => create.mutateAsync(body),
    (bench) => {
      draft.saved();
      say(`${bench.name} is added.`);
      router.replace(`/bench/${bench.id}`);
    },
  );
  return (
    <Screen
      title="New bench"
      back="/bench"
      list={benchSide(equipment, mayEdit)}
      measure={720}
      foot={<SaveFoot label="Add the bench" busy={busy} onSave={submit} cancel="/bench" />}
    >
      <FormFrame problem={problem} problemTitle="The bench is not added." draft={draft}>
        <FormField control={form.control} name="name" label="Name" hint="As it is called in the room: Bench 2." />
        <RevisionFields
          control={form.control}
          at="revision."
          lasers={equipment.data?.lasers ?? []}
          cameras={equipment.data?.cameras ?? []}
        />
      </FormFrame>
    </Screen>
  );
}
