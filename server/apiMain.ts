import { ConfigError, readConfig } from './config';
import { createLogger } from './http/logging';
import { startApi, StartError } from './startApi';

async function main(): Promise<void> {
  const config = readConfig();
  const log = createLogger('api', config.logLevel);
  const api = await startApi(config, log);
  let stopping = false;
  const stop = (): void => {
    if (stopping) return;
    stopping = true;
    api.stop().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'api did not stop cleanly');
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
}

main().catch((error: unknown) => {
  const known = error instanceof ConfigError || error instanceof StartError;
  process.stderr.write(
    `${known ? error.message : error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
  process.exit(1);
});
