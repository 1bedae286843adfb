import { useMutation, useQuery } from '@tanstack/react-query';
import { renameKeptUser } from '@/hooks/api/accessToken';
import { call } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import { accountEndpoints } from '@/shared/contracts/accounts';
import type { BodyInputOf } from '@/shared/contracts/endpoint';

export const accountKeys = {
  welcome: ['welcome'] as const,
  inbox: ['inbox'] as const,
  invitation: (token: string) => ['invitation', token] as const,
};

/** What the sign-in page shows: in demo mode the sign-ins of the demo laboratory. */
export function useWelcome() {
  return useQuery({
    queryKey: accountKeys.welcome,
    queryFn: ({ signal }) => call(accountEndpoints.welcome, { signal }),
    staleTime: fresh.fixed,
  });
}

/** Mail that the local fake has caught; looked at again every three seconds while the page is open. */
export function useInbox() {
  return useQuery({
    queryKey: accountKeys.inbox,
    queryFn: ({ signal }) => call(accountEndpoints.inbox, { signal }),
    refetchInterval: 3000,
  });
}

/** What an invitation offers. */
export function useInvitation(token: string) {
  return useQuery({
    queryKey: accountKeys.invitation(token),
    queryFn: ({ signal }) => call(accountEndpoints.invitation, { params: { token }, signal }),
    staleTime: fresh.fixed,
    enabled: token !== '',
  });
}

export function useForgotPassword() {
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.forgot>) => call(accountEndpoints.forgot, { body }),
  });
}

export function useResetPassword() {
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.reset>) => call(accountEndpoints.reset, { body }),
  });
}

export function useChangePassword() {
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.changePassword>) =>
      call(accountEndpoints.changePassword, { body }),
  });
}

/** Changes the own name; the session shows it at once. */
export function useUpdateAccount() {
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.updateAccount>) =>
      call(accountEndpoints.updateAccount, { body }),
    onSuccess: renameKeptUser,
  });
}
