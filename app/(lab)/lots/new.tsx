import { router } from 'expo-router';
import { LotForm } from '@/components/lots/LotForm';
import { useNotice } from '@/components/ui/NoticeProvider';
import { useAddClient } from '@/hooks/forms/useAddClient';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useClients } from '@/hooks/queries/clients';
import { useSaveLot } from '@/hooks/queries/lots';

export default function NewLotScreen() {
  const clients = useClients();
  const save = useSaveLot(null);
  const addClient = useAddClient();
  const { light } = useChosenBench();
  const { say } = useNotice();
  return (
    <LotForm
      title="New lot"
      back="/lots"
      draftName="lot.new"
      initial={{ number: '', clientId: '', orderReference: '', dueOn: null, note: '' }}
      clients={clients.data ?? []}
      saveLabel="Add the lot"
      addClient={addClient}
      light={light}
      onSave={async (body) => {
        const lot = await save.mutateAsync(body);
        say(`Lot ${lot.number} is added. Now add its pieces.`);
        router.replace(`/lots/${lot.id}/add`);
      }}
    />
  );
}
