import 'reflect-metadata';
import { DataSource, type DataSourceOptions } from 'typeorm';
import { ENTITIES } from './entities';
import { MIGRATIONS } from './migrations/list';
import { SnakeNaming } from './snake-naming';

export interface DatabaseAccount {
  readonly host: string;
  readonly port: number;
  readonly database: string;
  readonly user: string;
  readonly password: string;
}

/**
 * A data source for one of the two accounts: the owner migrates and then closes; the application works with the other,
 * which can't change a record.
 */
export function createDataSource(account: DatabaseAccount, poolSize: number): DataSource {
  const options: DataSourceOptions = {
    type: 'mariadb',
    host: account.host,
    port: account.port,
    database: account.database,
    username: account.user,
    password: account.password,
    charset: 'utf8mb4',
    timezone: 'Z',
    // DATE columns stay text; times come as Date.
    dateStrings: ['DATE'],
    namingStrategy: new SnakeNaming(),
    entities: ENTITIES,
    migrations: MIGRATIONS,
    migrationsTransactionMode: 'each',
    synchronize: false,
    logging: false,
    connectTimeout: 5_000,
    extra: { connectionLimit: poolSize, enableKeepAlive: true },
  };
  return new DataSource(options);
}
