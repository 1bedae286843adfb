import { useBenches } from './benches';
import { useCameras } from './cameras';
import { useLasers } from './lasers';

/** Benches, lasers and cameras together, as one result: they are shown in one list. */
export function useEquipment() {
  const benches = useBenches();
  const lasers = useLasers();
  const cameras = useCameras();
  const data =
    benches.data && lasers.data && cameras.data
      ? { benches: benches.data, lasers: lasers.data, cameras: cameras.data }
      : undefined;
  return {
    data,
    error: benches.error ?? lasers.error ?? cameras.error,
    refetch: () => Promise.all([benches.refetch(), lasers.refetch(), cameras.refetch()]),
  };
}
