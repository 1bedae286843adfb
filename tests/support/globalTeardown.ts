import { discardCluster } from './testCluster';

/** Stops and removes this run's cluster. */
export default function globalTeardown(): void {
  const folder = process.env.RINGWRIGHT_TEST_RUN;
  if (folder !== undefined) discardCluster(folder);
}
