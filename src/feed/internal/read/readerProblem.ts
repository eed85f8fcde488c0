import { type Problem, problem } from '../../../terms/problem.ts';

type Reason = { readonly sign: RegExp; readonly words: (found: RegExpExecArray) => string };

/** What the reader's own errors mean, by the part of their text that has been stable; the rest is told as unreadable. */
const reasons: readonly Reason[] = [
  {
    sign: /Expected Number of Columns: (\d+) Found: (\d+)/,
    words: ([, expected, found]) => `has ${found} cells where the first row names ${expected} columns`,
  },
  {
    sign: /unterminated quote|quote should be followed/i,
    words: () => 'has a quotation mark that is not closed where its cell ends',
  },
  { sign: /Invalid unicode|not utf-8/i, words: () => 'is not text in UTF-8' },
  {
    sign: /Maximum line size|Buffer Size/i,
    words: () => 'is longer than the 1,000,000 bytes that a row may have',
  },
];

const lastReason = 'The file mixes kinds of line ends or is not written as CSV is';

/** A query that the reader does not understand is a bug here, whatever the file. */
const isOurBug = /^(Binder|Parser|Catalog|Syntax) Error/;

/** Why the reader stopped, in our own words: the file, the row where the reader names one, and what was expected. */
export const readerProblem = (path: string, kind: string, error: unknown): Problem => {
  const text = error instanceof Error ? error.message : '';
  if (!(error instanceof Error) || isOurBug.test(text)) throw error;
  const row = /CSV Error on Line: (\d+)/.exec(text)?.[1];
  for (const { sign, words } of reasons) {
    const found = sign.exec(text);
    if (found === null) continue;
    const where = row === undefined ? 'A row' : `Row ${row}`;
    return problem(
      'fileUnreadable',
      `${path}: ${where} ${words(found)}. Correct the file and save it again.`,
    );
  }
  const why = kind === 'parquet' ? 'It is not a whole Parquet file' : lastReason;
  return problem('fileUnreadable', `${path} cannot be read. ${why}. Write it again.`);
};
