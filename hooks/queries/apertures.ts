import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { lotEndpoints } from '@/shared/contracts/lots';

export const apertureKeys = {
  all: ['apertures'] as const,
  list: (search: string) => [...apertureKeys.all, 'list', search] as const,
  detail: (apertureId: string) => [...apertureKeys.all, 'detail', apertureId] as const,
};

/** Apertures of all lots, newest lot first, whose serial or lot fits the search. */
export function useApertures(search = '') {
  const text = search.trim();
  return useQuery({
    queryKey: apertureKeys.list(text),
    queryFn: ({ signal }) => call(lotEndpoints.apertures, { query: text === '' ? {} : { search: text }, signal }),
    placeholderData: keepPreviousData,
  });
}

export function useAperture(apertureId: string) {
  return useQuery({
    queryKey: apertureKeys.detail(apertureId),
    queryFn: ({ signal }) => call(lotEndpoints.aperture, { params: { apertureId }, signal }),
  });
}
