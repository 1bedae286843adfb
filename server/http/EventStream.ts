import type { Response } from 'express';

/** A comment is sent this often, ms, so that nothing between server and browser takes the stream for dead. */
export const KEEP_ALIVE_MS = 15_000;

/** Server-sent events (HTML standard, section 9.2) on one answer. */
export class EventStream {
  private readonly timers: NodeJS.Timeout[] = [];
  private readonly closing: (() => void)[] = [];

  /** Opens the stream; it ends by itself at `until`, when the access token does. */
  constructor(
    private readonly response: Response,
    until: Date,
  ) {
    response.status(200).set({
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store, no-transform',
      'X-Accel-Buffering': 'no',
    });
    response.flushHeaders();
    response.write(': open\n\n');
    this.timers.push(setInterval(() => response.write(': still here\n\n'), KEEP_ALIVE_MS));
    this.timers.push(setTimeout(() => this.end(), Math.max(0, until.getTime() - Date.now())));
    response.on('close', () => this.closed());
  }

  /** Sends one event; the data are one line of JSON. */
  send(type: string, data: unknown): void {
    if (!this.response.writableEnded) this.response.write(`event: ${type}\ndata: ${JSON.stringify(data)}\n\n`);
  }

  /** Calls `work` once when the stream has ended, whoever ended it; at once if it has. */
  onClose(work: () => void): void {
    if (this.response.closed) work();
    else this.closing.push(work);
  }

  end(): void {
    this.response.end();
  }

  private closed(): void {
    for (const timer of this.timers) clearTimeout(timer);
    for (const work of this.closing.splice(0)) work();
  }
}
