import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import { benchEndpoints } from '@/shared/contracts/benches';
import type { BodyInputOf } from '@/shared/contracts/endpoint';
import { benchKeys } from './benches';

export const laserKeys = {
  all: ['lasers'] as const,
  list: () => [...laserKeys.all, 'list'] as const,
};

export function useLasers() {
  return useQuery({
    queryKey: laserKeys.list(),
    queryFn: ({ signal }) => call(benchEndpoints.lasers, { signal }),
    staleTime: fresh.records,
  });
}

/** Adds a laser, or changes the one whose id is given; the current revisions of the benches show it too. */
export function useSaveLaser(laserId: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof benchEndpoints.createLaser>) =>
      laserId === null
        ? call(benchEndpoints.createLaser, { body })
        : call(benchEndpoints.updateLaser, { params: { laserId }, body }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: laserKeys.all }),
        client.invalidateQueries({ queryKey: benchKeys.all }),
      ]),
  });
}
