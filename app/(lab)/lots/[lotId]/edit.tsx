import { router, useLocalSearchParams } from 'expo-router';
import { LotForm } from '@/components/lots/LotForm';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { useNotice } from '@/components/ui/NoticeProvider';
import { useAddClient } from '@/hooks/forms/useAddClient';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useClients } from '@/hooks/queries/clients';
import { useLot, useSaveLot } from '@/hooks/queries/lots';

export default function EditLotScreen() {
  const { lotId } = useLocalSearchParams<{ lotId: string }>();
  const lot = useLot(lotId);
  const clients = useClients();
  const save = useSaveLot(lotId);
  const addClient = useAddClient();
  const { light } = useChosenBench();
  const { say } = useNotice();
  return (
    <AwaitedScreen result={lot} what="the lot" title="Change the lot" back={`/lots/${lotId}`}>
      {(data) => (
        <LotForm
          title={`Change lot ${data.number}`}
          back={`/lots/${lotId}`}
          draftName={`lot.${lotId}`}
          initial={{
            number: data.number,
            clientId: data.clientId,
            orderReference: data.orderReference,
            dueOn: data.dueOn,
            note: data.note,
          }}
          clients={clients.data ?? []}
          saveLabel="Save the lot"
          addClient={addClient}
          light={light}
          onSave={async (body) => {
            await save.mutateAsync(body);
            say('The lot is saved.');
            router.replace(`/lots/${lotId}`);
          }}
        />
      )}
    </AwaitedScreen>
  );
}
