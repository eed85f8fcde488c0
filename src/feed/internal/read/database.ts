import { type DuckDBConnection, DuckDBInstance } from '@duckdb/node-api';

/** A text as an SQL literal. */
export const sqlText = (text: string): string => `'${text.replaceAll("'", "''")}'`;

const options = {
  // files of the desk and nothing else: no extension is fetched from anywhere
  autoinstall_known_extensions: 'false',
  autoload_known_extensions: 'false',
};

/** Runs `work` on a database of its own, which is gone afterwards with all its memory. */
export const withDatabase = async <Value>(
  work: (connection: DuckDBConnection) => Promise<Value>,
): Promise<Value> => {
  const database = await DuckDBInstance.create(':memory:', options);
  try {
    const connection = await database.connect();
    try {
      // the default of 1 MB makes the reading threads wait for every few rows that are taken
      await connection.run("SET streaming_buffer_size = '32MB'");
      return await work(connection);
    } finally {
      connection.closeSync();
    }
  } finally {
    database.closeSync();
  }
};
