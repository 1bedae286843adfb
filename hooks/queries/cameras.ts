import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import { benchEndpoints } from '@/shared/contracts/benches';
import type { BodyInputOf } from '@/shared/contracts/endpoint';
import { benchKeys } from './benches';

export const cameraKeys = {
  all: ['cameras'] as const,
  list: () => [...cameraKeys.all, 'list'] as const,
};

export function useCameras() {
  return useQuery({
    queryKey: cameraKeys.list(),
    queryFn: ({ signal }) => call(benchEndpoints.cameras, { signal }),
    staleTime: fresh.records,
  });
}

/** Adds a camera, or changes the one whose id is given; the current revisions of the benches show it too. */
export function useSaveCamera(cameraId: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof benchEndpoints.createCamera>) =>
      cameraId === null
        ? call(benchEndpoints.createCamera, { body })
        : call(benchEndpoints.updateCamera, { params: { cameraId }, body }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: cameraKeys.all }),
        client.invalidateQueries({ queryKey: benchKeys.all }),
      ]),
  });
}
