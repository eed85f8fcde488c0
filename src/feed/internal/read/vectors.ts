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

/** The chunks of a streamed result in the order of the file. */
export async function* chunksOf(result: DuckDBResult): AsyncGenerator<DuckDBDataChunk> {
  for (;;) {
    const chunk = await result.fetchChunk();
    if (chunk === null || chunk.rowCount === 0) return;
    yield chunk;
  }
}
