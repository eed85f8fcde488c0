import { expect } from 'vitest';
import type { Database } from '../../../src/feed/internal/read/database.ts';
import { openFiles } from '../../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../../src/feed/priceFiles.ts';
import { isoFromDay, isWeekday } from '../../../src/terms/day.ts';
import type { TextFormat } from '../../../src/terms/tableFormat.ts';
import { longCsv } from '../settingsForTests.ts';
import { editedFile, edits, makeChance } from './edits.ts';
import { judge } from './judge.ts';
import { dayFirstFormat, type PlainFormat, plainFormat } from './plainReading.ts';

/** Six tickers over thirty weekdays. */
export const goodFile = (): Buffer => {
  const chance = makeChance(1);
  const rows = ['KELP', 'TARN', 'BRINE', 'GANNET.B', 'LIMPET', 'WRACK'].flatMap((ticker, at) =>
    Array.from({ length: 42 }, (_, day) => 20_458 + day)
      .filter(isWeekday)
      .map((day) => `${isoFromDay(day)},${ticker},${(10 + 7 * at + chance.below(100) / 100).toFixed(2)}`),
  );
  return Buffer.from(`date,ticker,close\n${rows.join('\n')}\n`);
};

type Write = (name: string, content: Uint8Array) => string;

/** How a fuzzed file is written, how the feed is told of it, and how it is read plainly. */
export type Dialect = {
  readonly plain: PlainFormat;
  readonly format: TextFormat;
  readonly write: (bytes: Buffer, seed: number) => Buffer;
};

export const isoDialect: Dialect = {
  plain: plainFormat,
  format: { delimiter: 'comma', decimalMark: 'point', dateFormat: 'YYYY-MM-DD' },
  write: (bytes) => bytes,
};

export const dayFirstDialect: Dialect = {
  plain: dayFirstFormat,
  format: { delimiter: 'semicolon', decimalMark: 'comma', dateFormat: 'DD/MM/YYYY' },
  write: (bytes, seed) => {
    const text = bytes.toString('latin1').replaceAll(',', ';').replaceAll('.', ',');
    const written = Buffer.from(text.replaceAll(/(\d{4})-(\d{2})-(\d{2})/g, '$3/$2/$1'), 'latin1');
    const chance = makeChance(seed + 7);
    return (
      edits[chance.one(['flipBit', 'setByte', 'insertByte', 'deleteBytes'])]?.(written, chance) ?? written
    );
  },
};

/** Reads one file with a name of its own and judges the outcome. */
export const readAndJudge = async (
  bytes: Buffer,
  dialect: Dialect,
  write: Write,
  database: Database,
): Promise<'refused' | 'served'> => {
  const path = write('prices.csv', bytes);
  const settings = longCsv(path, { format: dialect.format });
  const outcome = await openFiles(await listPriceFiles(path), settings, Date.UTC(2026, 11, 1), database);
  return judge(bytes, dialect.plain, outcome);
};

/** Judges a range of edited files; both outcomes must occur, or the edits test nothing. */
export const fuzz = async (
  from: number,
  count: number,
  dialect: Dialect,
  write: Write,
  database: Database,
): Promise<void> => {
  const good = goodFile();
  const outcomes = { refused: 0, served: 0 };
  for (let seed = from; seed < from + count; seed += 1) {
    const { bytes, done } = editedFile(good, seed);
    try {
      outcomes[await readAndJudge(dialect.write(bytes, seed), dialect, write, database)] += 1;
    } catch (error) {
      throw new Error(
        `seed ${seed}, ${done.join(' then ')}: ${error instanceof Error ? error.message : error}`,
      );
    }
  }
  expect(outcomes.refused).toBeGreaterThan(count / 10);
  expect(outcomes.served).toBeGreaterThan(count / 10);
};
