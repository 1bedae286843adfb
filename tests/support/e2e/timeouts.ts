// A browser test waits for real measurements on a machine that may be busy.
jest.setTimeout(180_000);
