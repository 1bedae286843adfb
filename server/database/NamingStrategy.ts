import { DefaultNamingStrategy, type NamingStrategyInterface, type Table } from 'typeorm';

const snake = (text: string): string => text.replace(/([a-z0-9])([A-Z])/g, '$1_$2').toLowerCase();

/** Columns in snake case, and constraint names that a person can read in an error message. */
export class NamingStrategy extends DefaultNamingStrategy implements NamingStrategyInterface {
  override columnName(propertyName: string, customName: string | undefined): string {
    return customName ?? snake(propertyName);
  }

  override primaryKeyName(tableOrName: Table | string): string {
    return `pk_${this.getTableName(tableOrName)}`;
  }

  override foreignKeyName(tableOrName: Table | string, columnNames: string[]): string {
    const own = columnNames.length === 1 ? columnNames : columnNames.filter((name) => name !== 'laboratory_id');
    return `fk_${this.getTableName(tableOrName)}_${own.join('_')}`;
  }
}
