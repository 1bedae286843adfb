import type { DataSource, EntityManager } from 'typeorm';

/** The database as the rest of the server sees it; what it can do is used in repositories only. */
export type Database = DataSource;

/** A transaction in progress, or the database itself outside of one: to be handed on to repositories. */
export type Transaction = EntityManager;
