import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/api/call';
import { pollEvery, useStreamIsDown } from '@/hooks/events/streamState';
import { captureEndpoints, type CaptureDetail, type FrameKind } from '@/shared/contracts/captures';
import type { MeasurementSettings } from '@/shared/contracts/measurements';
import { measurementKeys } from './measurements';

export interface CaptureFilter {
  apertureId?: string;
  lotId?: string;
}

export const captureKeys = {
  all: ['captures'] as const,
  lists: ['captures', 'list'] as const,
  list: (filter: CaptureFilter) => ['captures', 'list', filter] as const,
  detail: (captureId: string) => ['captures', 'detail', captureId] as const,
};

const capturesQuery = (filter: CaptureFilter) =>
  queryOptions({
    queryKey: captureKeys.list(filter),
    queryFn: ({ signal }) => call(captureEndpoints.captures, { query: filter, signal }),
  });
const captureQuery = (captureId: string) =>
  queryOptions({
    queryKey: captureKeys.detail(captureId),
    queryFn: ({ signal }) => call(captureEndpoints.capture, { params: { captureId }, signal }),
  });

/** Whether something in the capture is still to come by itself. */
export function isCaptureMoving(capture: CaptureDetail): boolean {
  return capture.frames.some(
    ({ state, measurement }) =>
      state === 'stored' || measurement?.state === 'waiting' || measurement?.state === 'measuring',
  );
}

export function useCaptures(filter: CaptureFilter = {}) {
  return useQuery(capturesQuery(filter));
}

/** A capture that keeps itself up to date while its frames are looked at and measured. */
export function useCapture(captureId: string) {
  const streamIsDown = useStreamIsDown();
  return useQuery({
    ...captureQuery(captureId),
    refetchInterval: ({ state }) => (state.data && isCaptureMoving(state.data) ? pollEvery(streamIsDown) : false),
  });
}

export function useCreateCapture() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { apertureId: string; benchId: string; note?: string }) =>
      call(captureEndpoints.createCapture, { body }),
    onSuccess: (capture) => {
      client.setQueryData(captureKeys.detail(capture.id), capture);
      void client.invalidateQueries({ queryKey: captureKeys.lists });
    },
  });
}

/** Changes what a frame is, or leaves it out of the mean. */
export function useUpdatePlace(captureId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ captureFrameId, ...body }: { captureFrameId: string; kind?: FrameKind; leftOut?: boolean }) =>
      call(captureEndpoints.updatePlace, { params: { captureId, captureFrameId }, body }),
    onSuccess: (place) => {
      client.setQueryData(
        captureQuery(captureId).queryKey,
        (capture) =>
          capture && { ...capture, frames: capture.frames.map((frame) => (frame.id === place.id ? place : frame)) },
      );
    },
    onSettled: () => client.invalidateQueries({ queryKey: captureKeys.all }),
  });
}

/** Measures the lights that have no run, or whose run used fewer darks than there are now. */
export function useMeasureCapture(captureId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (settings: Partial<MeasurementSettings> = {}) =>
      call(captureEndpoints.measureCapture, { params: { captureId }, body: settings }),
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: captureKeys.detail(captureId) }),
        client.invalidateQueries({ queryKey: measurementKeys.lists }),
      ]),
  });
}
