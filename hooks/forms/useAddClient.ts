import { ApiProblem } from '@/hooks/api/ApiProblem';
import { useSaveClient } from '@/hooks/queries/clients';
import type { ClientBody } from '@/shared/contracts/lots';

/** Adds a client from within another form. */
export function useAddClient() {
  const save = useSaveClient(null);
  return {
    add: async (body: ClientBody) => (await save.mutateAsync(body)).id,
    busy: save.isPending,
    problem: save.error instanceof ApiProblem ? save.error : null,
  };
}
