import type { DuckDBDataChunk } from '@duckdb/node-api';
import duckdb from '@duckdb/node-bindings';

/** The memory of a column of a chunk, good for as long as the chunk is. Asking for values one by one takes many times longer. */
const bytesOf = (chunk: DuckDBDataChunk, column: number, bytesPerRow: number): Uint8Array =>
  duckdb.vector_get_data(duckdb.data_chunk_get_vector(chunk.chunk, column), chunk.rowCount * bytesPerRow);

/** A column of type INTEGER without nulls. */
export const rawInts = (chunk: DuckDBDataChunk, column: number): Int32Array => {
  const { buffer, byteOffset } = bytesOf(chunk, column, 4);
  return new Int32Array(buffer, byteOffset, chunk.rowCount);
};

/** A column of type DOUBLE without nulls. */
export const rawDoubles = (chunk: DuckDBDataChunk, column: number): Float64Array => {
  const { buffer, byteOffset } = bytesOf(chunk, column, 8);
  return new Float64Array(buffer, byteOffset, chunk.rowCount);
};

/**
 * A column of type VARCHAR without nulls, four words a text: its length in bytes and, up to twelve bytes, the bytes
 * themselves padded with zeros. Longer texts stand elsewhere.
 */
export const rawTextWords = (chunk: DuckDBDataChunk, column: number): Int32Array => {
  const { buffer, byteOffset } = bytesOf(chunk, column, 16);
  return new Int32Array(buffer, byteOffset, 4 * chunk.rowCount);
};

export const longestWordedText = 12;
