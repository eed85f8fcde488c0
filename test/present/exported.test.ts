import { describe, expect, test } from 'vitest';
import { answerQuestion } from '../../src/answers/answerQuestion.ts';
import { csvHead, csvRow, type Exported, jsonLine } from '../../src/present/exported.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { accepted } from '../laws/outcomes.ts';
import { questionIn } from '../questions/asking.ts';
import { answerOf, askingAt } from '../records/madeRecords.ts';

const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };
const read = questionIn('interval KELP');
const answers = accepted(answerQuestion({ read, series: [seriesOf('KELP', wobbling(90))], policy }));

const { series: _series, ...answer } = answerOf('R-7Q2M9K4TXD');

const withWords = (words: string): Exported => ({
  entry: { ...answer, number: 7, tickers: ['KELP'], asking: askingAt(0, { words }) },
  answers,
});

/** Cells of one CSV row by RFC 4180, section 2: quoted cells end at a quote that is not doubled. */
const cellsOf = (line: string): readonly string[] =>
  [...line.matchAll(/(?:^|,)(?:"((?:[^"]|"")*)"|([^,]*))/g)].map(([, quoted, bare]) =>
    quoted === undefined ? (bare ?? '') : quoted.replaceAll('""', '"'),
  );

const wordsAt = cellsOf(csvHead()).indexOf('words');

describe('an exported record', () => {
  test('is one line of JSON with the words, the reply, the versions and every figure', () => {
    const line = jsonLine(withWords('interval\nkelp'));
    expect(line).not.toContain('\n');
    expect(JSON.parse(line)).toMatchObject({
      number: 7,
      id: 'R-7Q2M9K4TXD',
      askedAt: '1970-01-01T00:00:00.000Z',
      place: 'channel',
      from: { person: 'U1' },
      words: 'interval\nkelp',
      versions: { bot: '0.1.0' },
      answers: [{ figures: answers[0].figures }],
    });
  });

  test('is one row of CSV with a cell for each column, whatever was typed', () => {
    const words = 'a "quoted", word\r\nand a line';
    const cells = cellsOf(csvRow(withWords(words)));
    expect(cells).toHaveLength(cellsOf(csvHead()).length);
    expect(cells[wordsAt]).toBe(words);
    expect(JSON.parse(cells.at(-1) ?? '')).toEqual(JSON.parse(JSON.stringify([answers[0].figures])));
  });

  test.each(['=1+1', '+1', '-1', '@SUM(A1)', '\t=1'])('typed %j is no formula in a spreadsheet', (words) => {
    expect(cellsOf(csvRow(withWords(words)))[wordsAt]).toBe(`'${words}`);
  });
});
