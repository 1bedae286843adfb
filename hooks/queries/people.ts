import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import { accountEndpoints } from '@/shared/contracts/accounts';
import type { BodyInputOf } from '@/shared/contracts/endpoint';

export const peopleKeys = {
  all: ['people'] as const,
  list: () => [...peopleKeys.all, 'list'] as const,
  invitations: () => [...peopleKeys.all, 'invitations'] as const,
};

/** People of the laboratory, those whose access has ended included. */
export function usePeople() {
  return useQuery({
    queryKey: peopleKeys.list(),
    queryFn: ({ signal }) => call(accountEndpoints.people, { signal }),
    staleTime: fresh.records,
  });
}

/** Invitations not yet taken up. */
export function useInvitations() {
  return useQuery({
    queryKey: peopleKeys.invitations(),
    queryFn: ({ signal }) => call(accountEndpoints.invitations, { signal }),
    staleTime: fresh.work,
  });
}

export function useInvite() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.invite>) => call(accountEndpoints.invite, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: peopleKeys.all }),
  });
}

export function useWithdrawInvitation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (invitationId: string) => call(accountEndpoints.withdrawInvitation, { params: { invitationId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: peopleKeys.all }),
  });
}

/** Changes a role, or ends or restores access. */
export function useUpdatePerson(membershipId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.updatePerson>) =>
      call(accountEndpoints.updatePerson, { params: { membershipId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: peopleKeys.all }),
  });
}
