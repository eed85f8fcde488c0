import {
  type DuckDBDataChunk,
  DuckDBDoubleVector,
  type DuckDBResult,
  DuckDBVarCharVector,
} from '@duckdb/node-api';

const otherType = (column: number): Error =>
  new Error(`column ${column} of the query has another type than was asked for`);

export const doubles = (chunk: DuckDBDataChunk, column: number): DuckDBDoubleVector => {
  const vector = chunk.getColumnVector(column);
  if (!(vector instanceof DuckDBDoubleVector)) throw otherType(column);
  return vector;
};

export const texts = (chunk: DuckDBDataChunk, column: number): DuckDBVarCharVector => {
  const vector = chunk.getColumnVector(column);
  if (!(vector instanceof DuckDBVarCharVector)) throw otherType(column);
  return vector;
};

/** Chunks between two collections: a millisecond’s collecting for some twenty of reading. */
const chunksPerCollection = 32;

/**
 * The chunks of a streamed result in the order of the file. Each holds memory that the engine does not count, behind
 * an object too small for it to collect soon. Where its collector lies open, collecting the young objects every so
 * often lets the reader use the same memory again: new memory costs more time than the collecting.
 */
export async function* chunksOf(result: DuckDBResult): AsyncGenerator<DuckDBDataChunk> {
  for (let chunkCount = 1; ; chunkCount += 1) {
    const chunk = await result.fetchChunk();
    if (chunk === null || chunk.rowCount === 0) return;
    yield chunk;
    if (chunkCount % chunksPerCollection === 0) globalThis.gc?.({ type: 'minor' });
  }
}
