import { zodResolver } from '@hookform/resolvers/zod';
import { router, useLocalSearchParams } from 'expo-router';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { benchSide } from '@/components/benches/benchSide';
import { RevisionFields } from '@/components/benches/RevisionFields';
import { FormFrame } from '@/components/forms/FormFrame';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Plate } from '@/components/ui/Plate';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { useBench, useReviseBench } from '@/hooks/queries/benches';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';
import { revisionBody, type BenchDetail, type RevisionBody } from '@/shared/contracts/benches';

export default function ReviseBenchScreen() {
  const { benchId } = useLocalSearchParams<{ benchId: string }>();
  const bench = useBench(benchId);
  return (
    <AwaitedScreen result={bench} what="the bench" title="Revise the bench" back={`/bench/${benchId}`}>
      {(data) => <ReviseBench bench={data} />}
    </AwaitedScreen>
  );
}

function ReviseBench({ bench }: { bench: BenchDetail }) {
  const equipment = useEquipment();
  const mayEdit = useRole() === 'manager';
  const revise = useReviseBench(bench.id);
  const { say } = useNotice();
  const { laserId, cameraId, distanceMm, distanceUncertaintyMm, illumination, laser } = bench.current;
  const form = useForm<z.input<typeof revisionBody>, unknown, RevisionBody>({
    resolver: zodResolver(revisionBody),
    defaultValues: { laserId, cameraId, distanceMm, distanceUncertaintyMm, illumination, note: '' },
  });
  const draft = useDraft(`bench.${bench.id}`, form);
  const { submit, busy, problem } = useSubmit(
    form,
    (body) => revise.mutateAsync(body),
    (saved) => {
      draft.saved();
      say(`${saved.name} is now at revision ${saved.current.revision}.`);
      router.replace(`/bench/${bench.id}`);
    },
  );
  return (
    <Screen
      title={`Revise ${bench.name}`}
      subtitle={`makes revision ${bench.current.revision + 1}`}
      back={`/bench/${bench.id}`}
      list={benchSide(equipment, mayEdit, bench.id)}
      measure={720}
      wavelengthNm={laser.wavelengthNm}
      benchLabel={bench.name}
      foot={<SaveFoot label="Save the revision" busy={busy} onSave={submit} cancel={`/bench/${bench.id}`} />}
    >
      <Plate>
        <Text>Captures already begun keep the revision they have. New captures use the new one.</Text>
      </Plate>
      <FormFrame problem={problem} problemTitle="The bench is not revised." draft={draft}>
        <RevisionFields
          control={form.control}
          at=""
          lasers={equipment.data?.lasers ?? []}
          cameras={equipment.data?.cameras ?? []}
        />
      </FormFrame>
    </Screen>
  );
}
