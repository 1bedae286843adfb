import { ForeignKey, type ObjectType } from 'typeorm';

/** Check expression: the column holds one of the listed words. */
export const oneOf = (column: string, words: readonly string[]): string =>
  `${column} in (${words.map((word) => `'${word}'`).join(', ')})`;

/** Check expression: a finite number above zero (PostgreSQL sorts NaN above infinity). */
export const finitePositive = (column: string): string => `${column} > 0 and ${column} < 'infinity'`;

/** Check expression: a finite number, zero or more. */
export const finiteNotNegative = (column: string): string => `${column} >= 0 and ${column} < 'infinity'`;

/**
 * Composite foreign key (laboratory_id, column) → (laboratory_id, id): the database itself refuses a row that points
 * into another laboratory.
 */
export const Within = <T>(target: () => ObjectType<T>, property: string): ClassDecorator =>
  ForeignKey(target, ['laboratoryId', property], ['laboratoryId', 'id']);

/** The person must belong to the same laboratory as the row: (laboratory_id, column) → membership. */
export const ByMember = <T>(membership: () => ObjectType<T>, property: string): ClassDecorator =>
  ForeignKey(membership, ['laboratoryId', property], ['laboratoryId', 'userId']);
