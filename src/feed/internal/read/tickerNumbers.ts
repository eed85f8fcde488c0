import type { DuckDBDataChunk } from '@duckdb/node-api';
import { type Collected, isTickerName } from './collected.ts';
import { hasValue, longestWordedText, rawTextWords, valueBits } from './rawVectors.ts';
import { texts } from './vectors.ts';

/** Stands for a row without a ticker. */
export const noTicker = -1;
/** Stands for a ticker whose name cannot be one. */
export const wrongName = -2;

const firstCapacity = 1024;

/** A hash table from the four words of a short text to a number. Numbers from `wrongName` up are kept; free is less. */
const makeWordTable = () => {
  const free = wrongName - 1;
  let capacity = firstCapacity;
  let words = new Int32Array(4 * capacity);
  let numbers = new Int32Array(capacity).fill(free);
  let count = 0;

  /** The place of the words, or the free place where they belong. */
  const placeOf = (first: number, second: number, third: number, fourth: number): number => {
    let mixed = Math.imul(first ^ Math.imul(second, 0x9e3779b1), 0x85ebca6b);
    mixed = Math.imul(mixed ^ (mixed >>> 15) ^ Math.imul(third, 0xc2b2ae35) ^ fourth, 0x27d4eb2f);
    let place = (mixed ^ (mixed >>> 16)) & (capacity - 1);
    while (numbers[place] !== free) {
      const at = 4 * place;
      if (
        words[at] === first &&
        words[at + 1] === second &&
        words[at + 2] === third &&
        words[at + 3] === fourth
      )
        break;
      place = (place + 1) & (capacity - 1);
    }
    return place;
  };

  const grow = (): void => {
    const [oldWords, oldNumbers] = [words, numbers];
    capacity *= 2;
    words = new Int32Array(4 * capacity);
    numbers = new Int32Array(capacity).fill(free);
    oldNumbers.forEach((number, place) => {
      if (number === free) return;
      const [first = 0, second = 0, third = 0, fourth = 0] = oldWords.subarray(4 * place, 4 * place + 4);
      put(first, second, third, fourth, number);
    });
  };

  const put = (first: number, second: number, third: number, fourth: number, number: number): void => {
    const place = placeOf(first, second, third, fourth);
    words.set([first, second, third, fourth], 4 * place);
    numbers[place] = number;
  };

  return {
    /** null for words that have not been seen. */
    get: (first: number, second: number, third: number, fourth: number): number | null => {
      const number = numbers[placeOf(first, second, third, fourth)] as number;
      return number === free ? null : number;
    },
    add: (first: number, second: number, third: number, fourth: number, number: number): void => {
      put(first, second, third, fourth, number);
      count += 1;
      if (2 * count > capacity) grow();
    },
  };
};

/** Reads the numbers of the tickers of a chunk's rows into `numbers`. */
export type TickerReader = (chunk: DuckDBDataChunk, column: number, numbers: Int32Array) => void;

export const makeTickerReader = (collected: Collected): TickerReader => {
  const table = makeWordTable();
  const numberOf = (text: string): number => {
    const name = text.trim();
    if (name === '') return noTicker;
    return isTickerName(name) ? collected.numberOf(name) : wrongName;
  };
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
        number = known ?? numberOf(texts(chunk, column).getItem(row) ?? '');
        if (known === null && isShort) table.add(first, second, third, fourth, number);
      }
      numbers[row] = number;
    }
  };
};
