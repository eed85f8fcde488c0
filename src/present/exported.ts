import type { Answers } from '../answers/answer.ts';
import type { RecordEntry } from '../terms/records.ts';

/** One asking on record with the answers that it got. */
export type Exported = { readonly entry: RecordEntry; readonly answers: Answers };

const isoInstant = (instantMs: number): string => new Date(instantMs).toISOString();

/** The whole entry as one line of JSON. */
export const jsonLine = ({ entry, answers }: Exported): string => {
  const { number, ids, asking } = entry;
  const { askedAtMs, place, from, words, replyText, versions } = asking;
  return JSON.stringify({
    number,
    id: ids[0],
    askedAt: isoInstant(askedAtMs),
    place,
    from,
    words,
    replyText,
    versions,
    answers,
  });
};

type Column = readonly [string, (exported: Exported) => string | number | null];

const columns: readonly Column[] = [
  ['number', ({ entry }) => entry.number],
  ['askedAt', ({ entry }) => isoInstant(entry.asking.askedAtMs)],
  ['id', ({ entry }) => entry.ids[0]],
  ['verb', ({ entry }) => entry.verb],
  ['question', ({ entry }) => entry.question],
  ['tickers', ({ entry }) => entry.tickers.join(' ')],
  ['dataTo', ({ entry }) => entry.asOf],
  ['returnCount', ({ answers: [first] }) => first.returnCount],
  ['methodVersion', ({ entry }) => entry.methodVersion],
  ['botVersion', ({ entry }) => entry.asking.versions.bot],
  ['nodeVersion', ({ entry }) => entry.asking.versions.node],
  ['place', ({ entry }) => entry.asking.place],
  ['team', ({ entry }) => entry.asking.from.team],
  ['channel', ({ entry }) => entry.asking.from.channel],
  ['person', ({ entry }) => entry.asking.from.person],
  ['message', ({ entry }) => entry.asking.from.message],
  ['thread', ({ entry }) => entry.asking.from.thread],
  ['words', ({ entry }) => entry.asking.words],
  ['reply', ({ entry }) => entry.asking.replyText],
  ['figures', ({ answers }) => JSON.stringify(answers.map(({ figures }) => figures))],
];

/** A spreadsheet takes a cell that begins like a formula for one, and people’s words are among the cells. */
const harmless = (text: string): string => (/^[=+\-@\t\r]/.test(text) ? `'${text}` : text);

/** RFC 4180: a cell with a comma, a quote or a line end stands in quotes, and its quotes are doubled. */
const cell = (value: string | number | null): string => {
  const text = typeof value === 'string' ? harmless(value) : String(value ?? '');
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
};

const row = (cells: readonly (string | number | null)[]): string => cells.map(cell).join(',');

export const csvHead = (): string => row(columns.map(([name]) => name));

export const csvRow = (exported: Exported): string => row(columns.map(([, read]) => read(exported)));
