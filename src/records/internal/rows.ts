import type { PriceSeries } from '../../terms/prices.ts';
import type { RecordedAnswer, RecordedAsking } from '../../terms/records.ts';
import type { AnswerRow, AskingRow, PriceColumnsRow } from '../database.ts';
import { packPrices, unpackPrices } from './packing.ts';

type About = Pick<PriceSeries, 'meaning' | 'flags'>;

export type PackedSeries = {
  readonly prices: PriceColumnsRow;
  readonly about: string;
};

export const packSeries = (series: PriceSeries): PackedSeries => {
  const about: About = { meaning: series.meaning, flags: series.flags };
  return { prices: packPrices(series), about: JSON.stringify(about) };
};

export const unpackSeries = (ticker: string, about: string, packed: Uint8Array): PriceSeries => {
  // written by packSeries above
  const { meaning, flags }: About = JSON.parse(about);
  const { days, closes } = unpackPrices(ticker, packed);
  return { ticker, days, closes, meaning, flags };
};

export const answerRow = (answer: RecordedAnswer): Omit<AnswerRow, 'number'> => ({
  id: answer.ids[0],
  content: answer.content,
  verb: answer.verb,
  question: answer.question,
  as_of: answer.asOf,
  method_version: answer.methodVersion,
  body: answer.body,
});

export const askingRow = (answerId: string, asking: RecordedAsking): Omit<AskingRow, 'number'> => ({
  answer_id: answerId,
  asked_at_ms: asking.askedAtMs,
  place: asking.place,
  ...asking.from,
  words: asking.words,
  reply_text: asking.replyText,
  bot_version: asking.versions.bot,
  node_version: asking.versions.node,
  settings_hash: asking.versions.settingsHash,
});

export const askingOf = (row: AskingRow): RecordedAsking => ({
  askedAtMs: row.asked_at_ms,
  place: row.place,
  from: {
    team: row.team,
    channel: row.channel,
    person: row.person,
    message: row.message,
    thread: row.thread,
  },
  words: row.words,
  replyText: row.reply_text,
  versions: { bot: row.bot_version, node: row.node_version, settingsHash: row.settings_hash },
});
