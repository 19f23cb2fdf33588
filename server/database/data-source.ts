import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { entities } from './entities';
import { migrations } from './migrations/migrations';

interface DataSourceOptions {
  readonly poolSize?: number;
  /** How long one statement may take; 0 for as long as it takes. */
  readonly statementTimeoutMs?: number;
}

/** A way into the database; nothing is opened until `initialize`. */
export function createDataSource(url: string, options: DataSourceOptions = {}): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    entities,
    migrations,
    migrationsTableName: 'migration',
    migrationsTransactionMode: 'each',
    poolSize: options.poolSize ?? 10,
    connectTimeoutMS: 10_000,
    applicationName: 'bayhand',
    logging: false,
    extra: { statement_timeout: options.statementTimeoutMs ?? 60_000, idle_in_transaction_session_timeout: 60_000 },
  });
}
