import type { DuckDBDataChunk } from '@duckdb/node-api';
import duckdb from '@duckdb/node-bindings';

/** The memory of a column of a chunk, good for as long as the chunk is. Asking for values one by one takes many times longer. */
const bytesOf = (chunk: DuckDBDataChunk, column: number, bytesPerRow: number): Uint8Array =>
  duckdb.vector_get_data(duckdb.data_chunk_get_vector(chunk.chunk, column), chunk.rowCount * bytesPerRow);

/** A column of type INTEGER, or of type DATE, which is kept as its days since 1970-01-01; where it has nulls there is anything in their place. */
export const rawInts = (chunk: DuckDBDataChunk, column: number): Int32Array => {
  const { buffer, byteOffset } = bytesOf(chunk, column, 4);
  return new Int32Array(buffer, byteOffset, chunk.rowCount);
};

/** A column of type DOUBLE; where it has nulls there is anything in their place. */
export const rawDoubles = (chunk: DuckDBDataChunk, column: number): Float64Array => {
  const { buffer, byteOffset } = bytesOf(chunk, column, 8);
  return new Float64Array(buffer, byteOffset, chunk.rowCount);
};

/**
 * A column of type VARCHAR, four words a text: its length in bytes and, up to twelve bytes, the bytes
 * themselves padded with zeros. Longer texts stand elsewhere.
 */
export const rawTextWords = (chunk: DuckDBDataChunk, column: number): Int32Array => {
  const { buffer, byteOffset } = bytesOf(chunk, column, 16);
  return new Int32Array(buffer, byteOffset, 4 * chunk.rowCount);
};

/** Which rows of a column have a value, one bit a row from the lowest on; null where all have. */
export type ValueBits = Uint8Array | null;

export const hasValue = (bits: ValueBits, row: number): boolean =>
  bits === null || (((bits[row >> 3] as number) >> (row & 7)) & 1) === 1;

/** The bits of a column, null where no value is missing. */
export const valueBits = (chunk: DuckDBDataChunk, column: number): ValueBits => {
  const { rowCount } = chunk;
  const vector = duckdb.data_chunk_get_vector(chunk.chunk, column);
  // typed as always there, but absent for a column that never had a null
  const bits: Uint8Array | null | undefined = duckdb.vector_get_validity(
    vector,
    8 * Math.ceil(rowCount / 64),
  );
  if (bits == null) return null;
  for (let row = 0; row < rowCount; row += 1) {
    const wholeByte = (row & 7) === 0 && row + 8 <= rowCount;
    if (wholeByte && bits[row >> 3] === 0xff) row += 7;
    else if (!hasValue(bits, row)) return bits;
  }
  return null;
};
