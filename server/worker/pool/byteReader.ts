import type { Duplex } from 'node:stream';

/**
 * Reads pieces of known length from a stream, each into memory of just that size. While nobody asks, the stream is
 * paused, so that no more than its own small buffer is held.
 */
export class ByteReader {
  private target: Buffer | null = null;
  private filled = 0;
  private settle: { resolve: (bytes: Buffer) => void; reject: (error: Error) => void } | null = null;
  private ended: Error | null = null;

  constructor(private readonly stream: Duplex) {
    stream.on('data', (chunk: Buffer) => this.take(chunk));
    stream.on('error', (error) => this.end(error));
    stream.on('close', () => this.end(new Error('The bytes channel was closed.')));
    stream.pause();
  }

  /** The next `length` bytes. One reading at a time. Rejects when the stream ends before they are there. */
  read(length: number): Promise<Buffer> {
    if (this.settle) throw new Error('A reading is already under way.');
    if (length === 0) return Promise.resolve(Buffer.alloc(0));
    if (this.ended) return Promise.reject(this.ended);
    this.target = Buffer.allocUnsafeSlow(length);
    this.filled = 0;
    return new Promise((resolve, reject) => {
      this.settle = { resolve, reject };
      this.stream.resume();
    });
  }

  private take(chunk: Buffer): void {
    if (!this.target || !this.settle) {
      this.stream.pause();
      this.stream.unshift(chunk);
      return;
    }
    const taken = chunk.copy(this.target, this.filled);
    this.filled += taken;
    if (this.filled < this.target.length) return;
    const { resolve } = this.settle;
    const whole = this.target;
    this.target = null;
    this.settle = null;
    this.stream.pause();
    if (taken < chunk.length) this.stream.unshift(chunk.subarray(taken));
    resolve(whole);
  }

  private end(error: Error): void {
    this.ended ??= error;
    const settle = this.settle;
    this.settle = null;
    this.target = null;
    settle?.reject(error);
  }
}
