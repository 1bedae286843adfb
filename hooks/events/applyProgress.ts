import type { QueryClient } from '@tanstack/react-query';
import { captureKeys } from '@/hooks/queries/captures';
import { measurementKeys } from '@/hooks/queries/measurements';
import type { CaptureDetail } from '@/shared/contracts/captures';
import type { MeasurementDetail, ProgressEvent } from '@/shared/contracts/measurements';

/** Events come in bursts: lists are read again once for all that came within this time, ms. */
const GATHER_MS = 150;

/**
 * Carries progress into what is on the screen: state and stage at once, everything else by reading it again.
 * @returns a function that takes events, and one that gives up what it still meant to read.
 */
export function applyProgress(client: QueryClient): {
  take: (event: ProgressEvent) => void;
  readAll: () => void;
  stop: () => void;
} {
  const captureIds = new Set<string>();
  const measurementIds = new Set<string>();
  let lists = false;
  let timer: ReturnType<typeof setTimeout> | undefined;

  function read(): void {
    timer = undefined;
    captureIds.forEach((id) => void client.invalidateQueries({ queryKey: captureKeys.detail(id) }));
    measurementIds.forEach((id) => void client.invalidateQueries({ queryKey: measurementKeys.detail(id) }));
    if (lists) {
      [captureKeys.lists, measurementKeys.lists, ['today'], ['lots'], ['apertures']].forEach(
        (queryKey) => void client.invalidateQueries({ queryKey }),
      );
    }
    captureIds.clear();
    measurementIds.clear();
    lists = false;
  }
  function soon(): void {
    timer ??= setTimeout(read, GATHER_MS);
  }

  function take(event: ProgressEvent): void {
    if (event.type === 'measurement') {
      const { state, stage, measurementId } = event;
      client.setQueryData<CaptureDetail>(
        captureKeys.detail(event.captureId),
        (capture) =>
          capture && {
            ...capture,
            frames: capture.frames.map((frame) =>
              frame.measurement?.id === measurementId && frame.measurement.finishedAt === null
                ? { ...frame, measurement: { ...frame.measurement, state, stage } }
                : frame,
            ),
          },
      );
      client.setQueryData<MeasurementDetail>(measurementKeys.detail(measurementId), (measurement) =>
        measurement && measurement.finishedAt === null ? { ...measurement, state, stage } : measurement,
      );
      const known = client
        .getQueryData<CaptureDetail>(captureKeys.detail(event.captureId))
        ?.frames.some((frame) => frame.measurement?.id === measurementId);
      const ended = state !== 'waiting' && state !== 'measuring';
      if (!ended && known) return;
      if (ended) {
        measurementIds.add(measurementId);
        lists = true;
      }
    }
    captureIds.add(event.captureId);
    soon();
  }

  return {
    take,
    readAll() {
      void client.invalidateQueries({ queryKey: captureKeys.all });
      void client.invalidateQueries({ queryKey: measurementKeys.lists });
      void client.invalidateQueries({ queryKey: measurementKeys.details });
      void client.invalidateQueries({ queryKey: ['today'] });
    },
    stop() {
      clearTimeout(timer);
    },
  };
}
