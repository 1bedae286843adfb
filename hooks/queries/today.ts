import { useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { todayEndpoints } from '@/shared/contracts/today';

export const todayKeys = { all: ['today'] as const };

/** What waits for the person signed in. */
export function useToday() {
  return useQuery({ queryKey: todayKeys.all, queryFn: ({ signal }) => call(todayEndpoints.today, { signal }) });
}
