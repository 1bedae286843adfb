import { randomUUID } from 'node:crypto';
import type { EntityTarget, FindOneOptions, FindOptionsOrder, FindOptionsWhere, QueryDeepPartialEntity } from 'typeorm';
import type { LaboratoryRow } from '../entities/LaboratoryRow';
import type { Database, Transaction } from './Database';

type Where<Row> = Omit<FindOptionsWhere<Row>, 'laboratoryId'>;
type Values<Row> = Partial<Omit<Row, 'laboratoryId'>>;

interface FindChoice<Row> {
  where?: Where<Row>;
  order?: FindOptionsOrder<Row>;
  /** Largest number of rows. */
  take?: number;
  /** Holds the rows until the transaction ends. */
  lock?: 'update' | 'share';
}

/**
 * The only way to the rows of a laboratory. Every read, change and hand-written statement made through it is confined
 * to one laboratory, so that no query can forget to say whose rows it means.
 */
export class LaboratoryScope {
  constructor(
    private readonly manager: Transaction,
    readonly laboratoryId: string,
  ) {}

  /** Rows as plain objects. */
  async find<Row extends LaboratoryRow>(entity: EntityTarget<Row>, choice: FindChoice<Row> = {}): Promise<Row[]> {
    const rows = await this.manager.find(entity, { ...this.options(choice), take: choice.take });
    return rows.map((row) => ({ ...row }));
  }

  /** One row as a plain object, or null: also when it belongs to another laboratory. */
  async findOne<Row extends LaboratoryRow>(entity: EntityTarget<Row>, choice: FindChoice<Row>): Promise<Row | null> {
    const row = await this.manager.findOne(entity, this.options(choice));
    return row === null ? null : { ...row };
  }

  /** Adds a row to the laboratory and returns its key; a key is made when none is given. */
  async insert<Row extends LaboratoryRow>(entity: EntityTarget<Row>, values: Values<Row>): Promise<string> {
    const [id] = await this.insertAll(entity, [values]);
    return id as string;
  }

  /** Adds rows to the laboratory in one statement and returns their keys in the same order. */
  async insertAll<Row extends LaboratoryRow>(entity: EntityTarget<Row>, rows: Values<Row>[]): Promise<string[]> {
    const own = rows.map((values) => ({ ...values, id: values.id ?? randomUUID(), laboratoryId: this.laboratoryId }));
    await this.manager.insert(entity, own as unknown as QueryDeepPartialEntity<Row>[]);
    return own.map((row) => row.id);
  }

  /** Changes the rows that match and returns how many they were. */
  async update<Row extends LaboratoryRow>(
    entity: EntityTarget<Row>,
    where: Where<Row>,
    change: Values<Row>,
  ): Promise<number> {
    const result = await this.manager.update(entity, this.own(where), change as unknown as QueryDeepPartialEntity<Row>);
    return result.affected ?? 0;
  }

  /** Deletes the rows that match and returns how many they were. */
  async delete<Row extends LaboratoryRow>(entity: EntityTarget<Row>, where: Where<Row>): Promise<number> {
    const result = await this.manager.delete(entity, this.own(where));
    return result.affected ?? 0;
  }

  /**
   * A hand-written statement; `$1` is always the laboratory and must be used, the given values follow from `$2` on.
   * Returns the rows with their column names as the statement gives them.
   */
  async query<Row extends object>(sql: string, values: readonly unknown[] = []): Promise<Row[]> {
    if (!/\$1\b/.test(sql)) throw new Error('A statement of a laboratory must use $1, the laboratory.');
    const runner = this.manager.queryRunner ?? this.manager.dataSource.createQueryRunner();
    try {
      const result = await runner.query(sql, [this.laboratoryId, ...values], true);
      return result.records as Row[];
    } finally {
      if (runner !== this.manager.queryRunner) await runner.release();
    }
  }

  private own<Row extends LaboratoryRow>(where: Where<Row> | undefined): FindOptionsWhere<Row> {
    return { ...where, laboratoryId: this.laboratoryId } as unknown as FindOptionsWhere<Row>;
  }

  private options<Row extends LaboratoryRow>(choice: FindChoice<Row>): FindOneOptions<Row> {
    return {
      where: this.own(choice.where),
      order: choice.order,
      lock: choice.lock && { mode: choice.lock === 'update' ? 'pessimistic_write' : 'pessimistic_read' },
    };
  }
}

/** Confines reads outside a transaction, or inside one that the caller owns, to a laboratory. */
export function scoped(source: Database | Transaction, laboratoryId: string): LaboratoryScope {
  return new LaboratoryScope('manager' in source ? source.manager : source, laboratoryId);
}

/** Runs the work in one transaction, confined to a laboratory; the manager is for what is not a laboratory's row. */
export function inLaboratory<Result>(
  database: Database,
  laboratoryId: string,
  work: (laboratory: LaboratoryScope, manager: Transaction) => Promise<Result>,
): Promise<Result> {
  return database.transaction((manager) => work(new LaboratoryScope(manager, laboratoryId), manager));
}
