import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import type { BodyInputOf } from '@/shared/contracts/endpoint';
import { lotEndpoints } from '@/shared/contracts/lots';
import { apertureKeys } from './apertures';
import { todayKeys } from './today';

export const lotKeys = {
  all: ['lots'] as const,
  list: () => [...lotKeys.all, 'list'] as const,
  detail: (lotId: string) => [...lotKeys.all, 'detail', lotId] as const,
};

export function useLots() {
  return useQuery({ queryKey: lotKeys.list(), queryFn: ({ signal }) => call(lotEndpoints.lots, { signal }) });
}

/** A lot with its apertures. */
export function useLot(lotId: string) {
  return useQuery({
    queryKey: lotKeys.detail(lotId),
    queryFn: ({ signal }) => call(lotEndpoints.lot, { params: { lotId }, signal }),
  });
}

function useLotsChanged() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: lotKeys.all }),
      client.invalidateQueries({ queryKey: apertureKeys.all }),
      client.invalidateQueries({ queryKey: todayKeys.all }),
    ]);
}

/** Adds a lot, or changes the one whose id is given. */
export function useSaveLot(lotId: string | null) {
  const changed = useLotsChanged();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof lotEndpoints.createLot>) =>
      lotId === null
        ? call(lotEndpoints.createLot, { body })
        : call(lotEndpoints.updateLot, { params: { lotId }, body }),
    onSuccess: changed,
  });
}

/** Adds apertures to a lot, all or none. */
export function useAddApertures(lotId: string) {
  const changed = useLotsChanged();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof lotEndpoints.addApertures>) =>
      call(lotEndpoints.addApertures, { params: { lotId }, body }),
    onSuccess: changed,
  });
}

export function useUpdateAperture(apertureId: string) {
  const changed = useLotsChanged();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof lotEndpoints.updateAperture>) =>
      call(lotEndpoints.updateAperture, { params: { apertureId }, body }),
    onSuccess: changed,
  });
}
