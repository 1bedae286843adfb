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
    // Heard from the first moment: who is asked to stop while it starts, stops when it has started.
    const asked = new Promise<void>((resolve) => {
      process.once('SIGTERM', resolve);
      process.once('SIGINT', resolve);
    });
    const service = await start(config, log);
    await asked;
    await service.stop().catch((error: unknown) => {
      log.error({ err: error }, `${name} did not stop cleanly`);
      process.exit(1);
    });
    process.exit(0);
  };

  main().catch((error: unknown) => {
    const known = error instanceof ConfigError || error instanceof StartError;
    process.stderr.write(
      `${known ? error.message : error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
    process.exit(1);
  });
}
