import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './ApiProblem';

/** How long an answer counts as new, ms. */
export const fresh = {
  /** Changes with every frame that is measured; the event stream says when. */
  work: 15_000,
  /** Benches, lasers, cameras, people: changed by hand. */
  records: 60_000,
  /** Never changes: numbers of a finished measurement, planes of a frame. */
  fixed: Infinity,
} as const;

/** One for each person and laboratory, so that nothing read for one is ever shown to another. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: fresh.work,
        retry: (failures, error) => failures < 2 && error instanceof ApiProblem && error.temporary,
        refetchOnWindowFocus: true,
      },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
