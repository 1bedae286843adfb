// The first test file that asks for a database waits for the cluster and its migrations, on a machine that may be busy.
jest.setTimeout(60_000);
