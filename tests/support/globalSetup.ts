import { discardAbandonedClusters, runFolder } from './testCluster';

/** Names the folder of this run's throw-away cluster; the first test that asks for a database starts it there. */
export default function globalSetup(): void {
  if (process.env.RINGWRIGHT_TEST_RUN !== undefined) return;
  discardAbandonedClusters();
  process.env.RINGWRIGHT_TEST_RUN = runFolder();
}
