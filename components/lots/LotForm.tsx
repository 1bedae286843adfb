import { zodResolver } from '@hookform/resolvers/zod';
import type { Href } from 'expo-router';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { FormFrame } from '@/components/forms/FormFrame';
import { SaveFoot } from '@/components/forms/SaveFoot';
import { Button } from '@/components/ui/Button';
import { Plate } from '@/components/ui/Plate';
import type { ShownProblem } from '@/components/ui/ProblemPlate';
import { Screen } from '@/components/ui/Screen';
import { useDraft } from '@/hooks/forms/useDraft';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { lotBody, type Client, type ClientBody, type LotBody } from '@/shared/contracts/lots';
import { ClientForm } from './ClientForm';
import { LotFields } from './LotFields';

export interface LotFormProps {
  title: string;
  subtitle?: string;
  back: Href;
  /** Name of its draft. */
  draftName: string;
  initial: LotBody;
  clients: readonly Client[];
  saveLabel: string;
  onSave: (body: LotBody) => Promise<void>;
  /** Adds a client and gives its id. */
  addClient: { add: (body: ClientBody) => Promise<string>; busy: boolean; problem: ShownProblem | null };
  light: { wavelengthNm: number | null; benchLabel: string | null };
}

/** A lot to be added or changed. */
export function LotForm({
  title,
  subtitle,
  back,
  draftName,
  initial,
  clients,
  saveLabel,
  onSave,
  addClient,
  light,
}: LotFormProps) {
  const form = useForm({ resolver: zodResolver(lotBody), defaultValues: initial });
  const draft = useDraft(draftName, form);
  const [adding, setAdding] = useState(false);
  const { submit, busy, problem } = useSubmit(form, onSave, draft.saved);
  const saveClient = (body: ClientBody) => {
    void addClient.add(body).then((clientId) => {
      form.setValue('clientId', clientId, { shouldDirty: true, shouldValidate: true });
      setAdding(false);
    });
  };
  return (
    <Screen
      title={title}
      subtitle={subtitle}
      back={back}
      measure={720}
      foot={<SaveFoot label={saveLabel} busy={busy} onSave={submit} cancel={back} />}
      {...light}
    >
      <FormFrame problem={problem} problemTitle="The lot is not saved." draft={draft}>
        <LotFields control={form.control} clients={clients} />
      </FormFrame>
      <Plate>
        {adding ? (
          <ClientForm
            busy={addClient.busy}
            problem={addClient.problem}
            onSave={saveClient}
            onCancel={() => setAdding(false)}
          />
        ) : (
          <Button label="Add a client" icon="plus" kind="quiet" onPress={() => setAdding(true)} />
        )}
      </Plate>
    </Screen>
  );
}
