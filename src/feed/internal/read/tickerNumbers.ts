import type { DuckDBDataChunk } from '@duckdb/node-api';
import { type Collected, noTicker, numberOfCell } from './collected.ts';
import { hasValue, rawTextWords, valueBits } from './rawVectors.ts';
import { texts } from './vectors.ts';
import { longestWordedText, makeWordTable } from './wordTable.ts';

/** Reads the numbers of the tickers of a chunk's rows into `numbers`. */
export type TickerReader = (chunk: DuckDBDataChunk, column: number, numbers: Int32Array) => void;

export const makeTickerReader = (collected: Collected): TickerReader => {
  const table = makeWordTable();
  return (chunk, column, numbers) => {
    const { rowCount } = chunk;
    const words = rawTextWords(chunk, column);
    const bits = valueBits(chunk, column);
    let [first, second, third, fourth, number] = [-1, 0, 0, 0, noTicker];
    for (let row = 0, at = 0; row < rowCount; row += 1, at += 4) {
      if (!hasValue(bits, row)) {
        numbers[row] = noTicker;
        continue;
      }
      if (
        words[at] !== first ||
        words[at + 1] !== second ||
        words[at + 2] !== third ||
        words[at + 3] !== fourth
      ) {
        first = words[at] as number;
        second = words[at + 1] as number;
        third = words[at + 2] as number;
        fourth = words[at + 3] as number;
        const isShort = first <= longestWordedText;
        const known = isShort ? table.get(first, second, third, fourth) : null;
        number = known ?? numberOfCell(texts(chunk, column).getItem(row) ?? '', collected);
        if (known === null && isShort) table.add(first, second, third, fourth, number);
      }
      numbers[row] = number;
    }
  };
};
