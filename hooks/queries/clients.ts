import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import type { BodyInputOf } from '@/shared/contracts/endpoint';
import { lotEndpoints } from '@/shared/contracts/lots';

export const clientKeys = {
  all: ['clients'] as const,
  list: () => [...clientKeys.all, 'list'] as const,
};

/** The laboratory's clients. */
export function useClients(enabled = true) {
  return useQuery({
    queryKey: clientKeys.list(),
    queryFn: ({ signal }) => call(lotEndpoints.clients, { signal }),
    staleTime: fresh.records,
    enabled,
  });
}

/** Adds a client, or changes the one whose id is given. */
export function useSaveClient(clientId: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof lotEndpoints.createClient>) =>
      clientId === null
        ? call(lotEndpoints.createClient, { body })
        : call(lotEndpoints.updateClient, { params: { clientId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: clientKeys.all }),
  });
}
