import type { Logger } from 'pino';
import { ConfigError, readConfig, type Config } from './config';
import { createLogger } from './http/logging';
import { StartError } from './StartError';

/**
 * Starts a service with the configuration of the environment and stops it on SIGTERM or SIGINT. What the person who
 * starts it can mend is said without a stack.
 */
export function runProcess(
  name: string,
  start: (config: Config, log: Logger) => Promise<{ stop(): Promise<void> }>,
): void {
  const main = async (): Promise<void> => {
    const config = readConfig();
    const log = createLogger(name, config.logLevel);
    const service = await start(config, log);
    let stopping = false;
    const stop = (): void => {
      if (stopping) return;
      stopping = true;
      service.stop().then(
        () => process.exit(0),
        (error: unknown) => {
          log.error({ err: error }, `${name} did not stop cleanly`);
          process.exit(1);
        },
      );
    };
    process.on('SIGTERM', stop);
    process.on('SIGINT', stop);
  };

  main().catch((error: unknown) => {
    const known = error instanceof ConfigError || error instanceof StartError;
    process.stderr.write(
      `${known ? error.message : error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
    process.exit(1);
  });
}
