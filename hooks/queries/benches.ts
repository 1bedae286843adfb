import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import { benchEndpoints } from '@/shared/contracts/benches';
import type { BodyInputOf } from '@/shared/contracts/endpoint';

export const benchKeys = {
  all: ['benches'] as const,
  list: () => [...benchKeys.all, 'list'] as const,
  detail: (benchId: string) => [...benchKeys.all, 'detail', benchId] as const,
};

export const benchesQuery = () =>
  queryOptions({
    queryKey: benchKeys.list(),
    queryFn: ({ signal }) => call(benchEndpoints.benches, { signal }),
    staleTime: fresh.records,
  });

/** Benches with their current revision. */
export function useBenches(enabled = true) {
  return useQuery({ ...benchesQuery(), enabled });
}

/** A bench with all its revisions, newest first. */
export function useBench(benchId: string) {
  return useQuery({
    queryKey: benchKeys.detail(benchId),
    queryFn: ({ signal }) => call(benchEndpoints.bench, { params: { benchId }, signal }),
    staleTime: fresh.records,
  });
}

export function useCreateBench() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof benchEndpoints.createBench>) => call(benchEndpoints.createBench, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: benchKeys.all }),
  });
}

export function useReviseBench(benchId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof benchEndpoints.reviseBench>) =>
      call(benchEndpoints.reviseBench, { params: { benchId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: benchKeys.all }),
  });
}
