import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { measurementEndpoints } from '@/shared/contracts/measurements';

export const comparisonKeys = {
  of: (measurementIds: readonly string[]) => ['comparison', measurementIds] as const,
};

/** Sizes and rings of the chosen measurements, which never change. While others are fetched the last ones stay. */
export function useComparison(measurementIds: readonly string[]) {
  return useQuery({
    queryKey: comparisonKeys.of(measurementIds),
    queryFn: ({ signal }) => call(measurementEndpoints.compared, { query: { ids: measurementIds.join(',') }, signal }),
    enabled: measurementIds.length > 0,
    placeholderData: keepPreviousData,
    staleTime: Infinity,
  });
}
