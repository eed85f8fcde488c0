import type { DuckDBConnection, DuckDBInstance } from '@duckdb/node-api';

/** A text as an SQL literal. */
export const sqlText = (text: string): string => `'${text.replaceAll("'", "''")}'`;

const options = {
  // files of the desk and nothing else: no extension is fetched from anywhere
  autoinstall_known_extensions: 'false',
  autoload_known_extensions: 'false',
};

/** Runs work on a connection of its own. */
export type Database = <Value>(work: (connection: DuckDBConnection) => Promise<Value>) => Promise<Value>;

const createInstance = async (): Promise<DuckDBInstance> => {
  // loaded when it is first needed
  const { DuckDBInstance } = await import('@duckdb/node-api');
  return DuckDBInstance.create(':memory:', options);
};

const runOn = async <Value>(
  instance: DuckDBInstance,
  work: (connection: DuckDBConnection) => Promise<Value>,
): Promise<Value> => {
  const connection = await instance.connect();
  try {
    // the default of 1 MB makes the reading threads wait for every few rows that are taken
    await connection.run("SET streaming_buffer_size = '2MB'");
    return await work(connection);
  } finally {
    connection.closeSync();
  }
};

/** A database that is made for the work and gone after it with all its memory. */
export const passingDatabase: Database = async (work) => {
  const instance = await createInstance();
  try {
    return await runOn(instance, work);
  } finally {
    instance.closeSync();
  }
};

/** A database that stays until it is closed, for whoever reads many small files in a row. */
export const openDatabase = async (): Promise<{
  readonly database: Database;
  readonly close: () => void;
}> => {
  const instance = await createInstance();
  return { database: (work) => runOn(instance, work), close: () => instance.closeSync() };
};
