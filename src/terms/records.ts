import type { InstantMs } from './clock.ts';
import type { PriceSeries } from './prices.ts';

/** Where something was asked, in the workspace’s own ids; null where the place has no such thing. */
export type AskedFrom = {
  readonly team: string | null;
  readonly channel: string | null;
  readonly person: string | null;
  readonly message: string | null;
  readonly thread: string | null;
};

export const askedFromNowhere: AskedFrom = {
  team: null,
  channel: null,
  person: null,
  message: null,
  thread: null,
};

/** What answered: a record can be worked out to the last bit on the same methods and the same major version of Node. */
export type Versions = {
  readonly bot: string;
  readonly node: string;
  /** Hex SHA-256 of the settings in force. */
  readonly settingsHash: string;
};

/** One answered question, kept once however often it is asked. */
export type RecordedAnswer = {
  /** One id, or one for each pair of a comparison. The first names the record; each finds it. */
  readonly ids: readonly [string, ...string[]];
  /** Hex SHA-256 of what was answered: records with the same one say the same. */
  readonly content: string;
  readonly verb: string;
  /** The canonical question. */
  readonly question: string;
  /** ISO date of the last price used. */
  readonly asOf: string;
  readonly methodVersion: string;
  /** The question, what it was worked out with, and the whole answer, as JSON. */
  readonly body: string;
  /** The very prices that it was worked out from. */
  readonly series: readonly PriceSeries[];
};

/** One time that an answer was given to somebody. */
export type RecordedAsking = {
  readonly askedAtMs: InstantMs;
  /** channel, direct, command or terminal. */
  readonly place: string;
  readonly from: AskedFrom;
  /** As they were typed. */
  readonly words: string;
  /** The reply as it was shown, in words. */
  readonly replyText: string;
  readonly versions: Versions;
};

/** One asking with the answer that it got, in few words. */
export type RecordLine = Pick<RecordedAsking, 'askedAtMs' | 'place' | 'from'> & {
  readonly id: string;
  readonly verb: string;
  readonly question: string;
};

/** A thread of a channel by the stamp of its first message; thread null: the messages of a direct conversation outside threads. */
export type ThreadPlace = {
  readonly team: string | null;
  readonly channel: string;
  readonly thread: string | null;
};

/** One asking with the question and the answers that it got, as they are kept. */
export type LastAnswered = Pick<RecordedAsking, 'askedAtMs' | 'place' | 'from'> &
  Pick<RecordedAnswer, 'verb' | 'body'> & { readonly id: string };

/** One asking with the whole answer that it got, without the prices. Numbers ascend in the order of keeping. */
export type RecordEntry = Omit<RecordedAnswer, 'series'> & {
  readonly number: number;
  readonly tickers: readonly string[];
  readonly asking: RecordedAsking;
};

export type RecordFilter = {
  readonly ticker: string | null;
  readonly sinceMs: InstantMs | null;
};

/** What an examination of all records found. */
export type RecordExamination = {
  readonly answers: number;
  readonly askings: number;
  readonly deletions: number;
  /** Hex SHA-256 of the last entry of the chain; it changes with every entry. */
  readonly head: string;
  /** What is wrong, a sentence each; empty where the records are whole. */
  readonly faults: readonly string[];
};
