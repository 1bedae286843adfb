import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call, callText } from '@/hooks/api/call';
import { pollEvery, useStreamIsDown } from '@/hooks/events/streamState';
import { measurementEndpoints, type MeasurementSettings, type MeasurementState } from '@/shared/contracts/measurements';

export interface MeasurementFilter {
  lotId?: string;
  apertureId?: string;
  state?: MeasurementState;
  limit?: number;
}

export const measurementKeys = {
  all: ['measurements'] as const,
  lists: ['measurements', 'list'] as const,
  list: (filter: MeasurementFilter) => ['measurements', 'list', filter] as const,
  details: ['measurements', 'detail'] as const,
  detail: (measurementId: string) => ['measurements', 'detail', measurementId] as const,
  profile: (measurementId: string) => ['measurements', 'profile', measurementId] as const,
};

const isRunning = (state: MeasurementState) => state === 'waiting' || state === 'measuring';

const measurementsQuery = (filter: MeasurementFilter) =>
  queryOptions({
    queryKey: measurementKeys.list(filter),
    queryFn: ({ signal }) => call(measurementEndpoints.measurements, { query: filter, signal }),
  });
const measurementQuery = (measurementId: string) =>
  queryOptions({
    queryKey: measurementKeys.detail(measurementId),
    queryFn: ({ signal }) => call(measurementEndpoints.measurement, { params: { measurementId }, signal }),
  });

/** The newest run of each frame, newest first. */
export function useMeasurements(filter: MeasurementFilter = {}) {
  return useQuery(measurementsQuery(filter));
}

/** A measurement that keeps itself up to date while it runs. Null: nothing is asked for. */
export function useMeasurement(measurementId: string | null) {
  const streamIsDown = useStreamIsDown();
  return useQuery({
    ...measurementQuery(measurementId ?? ''),
    enabled: measurementId !== null,
    refetchInterval: ({ state }) => (state.data && isRunning(state.data.state) ? pollEvery(streamIsDown) : false),
  });
}

/** The radial profile of a measured frame; it never changes. Null: nothing is asked for. */
export function useRadialProfile(measurementId: string | null) {
  return useQuery({
    queryKey: measurementKeys.profile(measurementId ?? ''),
    queryFn: ({ signal }) =>
      call(measurementEndpoints.radialProfile, { params: { measurementId: measurementId ?? '' }, signal }),
    enabled: measurementId !== null,
    staleTime: Infinity,
  });
}

/** Measures the same frame again; the old run stays. */
export function useMeasureAgain(measurementId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (settings: Partial<MeasurementSettings>) =>
      call(measurementEndpoints.measureAgain, { params: { measurementId }, body: settings }),
    onSuccess: (measurement) =>
      Promise.all([
        client.invalidateQueries({ queryKey: measurementKeys.all }),
        client.invalidateQueries({ queryKey: ['captures', 'detail', measurement.captureId] }),
      ]),
  });
}

/** Fetches the tables of a measurement as CSV text. */
export function useMeasurementCsv(measurementId: string) {
  return useMutation({
    mutationFn: (table: 'radialProfileCsv' | 'ringTableCsv') =>
      callText(measurementEndpoints[table], { params: { measurementId } }),
  });
}
