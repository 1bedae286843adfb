import type { Logger } from 'pino';

/** Work that goes on after its request has been answered; the process waits for it before it stops. */
export class Background {
  private readonly running = new Set<Promise<void>>();

  constructor(private readonly log: Logger) {}

  /** Starts the work and returns at once; what goes wrong is logged. */
  run(what: string, work: () => Promise<void>): void {
    const done = work()
      .catch((error: unknown) => this.log.error({ err: error }, `${what} failed after its answer`))
      .finally(() => this.running.delete(done));
    this.running.add(done);
  }

  /** Resolves when nothing is running any more. */
  async idle(): Promise<void> {
    while (this.running.size > 0) await Promise.all(this.running);
  }
}
