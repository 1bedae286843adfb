import { QueryClientProvider } from '@tanstack/react-query';
import { useEffect, useMemo, type ReactNode } from 'react';
import { createQueryClient } from '@/hooks/api/createQueryClient';
import { useSession } from './SessionProvider';

/** Gives every person and laboratory a store of answers of their own; it is emptied when they leave. */
export function QueriesOfSession({ children }: { children: ReactNode }) {
  const { state } = useSession();
  const owner = state.status === 'signed-in' ? state.session.membership.id : 'nobody';
  const client = useMemo(() => createClientFor(owner), [owner]);
  useEffect(() => () => client.clear(), [client]);
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}

function createClientFor(_owner: string) {
  return createQueryClient();
}
