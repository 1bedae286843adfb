import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { entities } from '../entities/entities';
import { CreateTables1796101200000 } from '../migrations/1796101200000-CreateTables';
import { RefuseChanges1796101260000 } from '../migrations/1796101260000-RefuseChanges';
import { NamingStrategy } from './NamingStrategy';

export interface DataSourceLimits {
  /** Connections in the pool. */
  poolSize: number;
  /** A statement that runs longer is stopped, ms; 0: no limit (migrations). */
  statementTimeoutMs: number;
}

/** What one process of the application may take from the database. */
export const applicationLimits: DataSourceLimits = { poolSize: 20, statementTimeoutMs: 30_000 };

/** Waiting longer than this for a connection or a lock is a fault, ms. */
const WAIT_MS = 10_000;
/** A transaction left open without work for longer than this is ended, ms. */
const IDLE_IN_TRANSACTION_MS = 60_000;

/**
 * Data source on the given database. The application connects with a role that owns no table; only migrations use the
 * owner. The schema is never synchronized from entities.
 */
export function createDataSource(
  url: string,
  applicationName: string,
  limits: DataSourceLimits = applicationLimits,
): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    applicationName,
    entities,
    migrations: [CreateTables1796101200000, RefuseChanges1796101260000],
    migrationsTableName: 'schema_migration',
    namingStrategy: new NamingStrategy(),
    synchronize: false,
    migrationsRun: false,
    installExtensions: false,
    logging: false,
    poolSize: limits.poolSize,
    connectTimeoutMS: WAIT_MS,
    extra: {
      statement_timeout: limits.statementTimeoutMs,
      lock_timeout: limits.statementTimeoutMs === 0 ? 0 : WAIT_MS,
      idle_in_transaction_session_timeout: IDLE_IN_TRANSACTION_MS,
    },
  });
}
