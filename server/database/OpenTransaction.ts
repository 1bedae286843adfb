import type { QueryRunner } from 'typeorm';
import type { Database, Transaction } from './Database';

/**
 * A transaction that stays open across several steps of a request. Whoever has it either commits it or rolls it back;
 * after the first of these further calls do nothing, so that a safety net may always roll back.
 */
export class OpenTransaction {
  private settled = false;

  private constructor(
    private readonly runner: QueryRunner,
    private readonly afterwards: () => void,
  ) {}

  /**
   * Begins a transaction on a connection of its own.
   * @param afterwards called once when the connection has been given back, whatever happened
   */
  static async begin(database: Database, afterwards: () => void): Promise<OpenTransaction> {
    const runner = database.createQueryRunner();
    try {
      await runner.startTransaction();
    } catch (error) {
      await runner.release();
      afterwards();
      throw error;
    }
    return new OpenTransaction(runner, afterwards);
  }

  get transaction(): Transaction {
    return this.runner.manager;
  }

  async commit(): Promise<void> {
    await this.settle(() => this.runner.commitTransaction());
  }

  async rollBack(): Promise<void> {
    // A connection that is gone has rolled back by itself.
    await this.settle(() => this.runner.rollbackTransaction().catch(() => undefined));
  }

  private async settle(how: () => Promise<void>): Promise<void> {
    if (this.settled) return;
    this.settled = true;
    try {
      await how();
    } finally {
      await this.runner.release();
      this.afterwards();
    }
  }
}
