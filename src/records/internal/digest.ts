import { createHash } from 'node:crypto';
import type { AnswerRow, AnswerSeriesRow, AskingRow, ChainRow } from '../database.ts';

/** Hex SHA-256 of the parts as JSON, so that no two lists of parts run into each other. */
const digestOf = (parts: readonly (string | number | null)[]): string =>
  createHash('sha256').update(JSON.stringify(parts)).digest('hex');

export const answerDigest = (
  row: Omit<AnswerRow, 'number'>,
  ids: readonly string[],
  series: readonly Omit<AnswerSeriesRow, 'answer_id' | 'place'>[],
): string =>
  digestOf([
    ids.join(' '),
    row.content,
    row.verb,
    row.question,
    row.as_of,
    row.method_version,
    row.body,
    ...series.flatMap(({ ticker, prices, about }) => [ticker, prices, about]),
  ]);

export const askingDigest = (row: Omit<AskingRow, 'number'>): string =>
  digestOf([
    row.answer_id,
    row.asked_at_ms,
    row.place,
    row.team,
    row.channel,
    row.person,
    row.message,
    row.thread,
    row.words,
    row.reply_text,
    row.bot_version,
    row.node_version,
    row.settings_hash,
  ]);

/** Each entry holds the hash of the one before it, so that none can be changed, added or taken out unnoticed. */
export const entryHash = ({ number, kind, subject, digest, previous }: Omit<ChainRow, 'hash'>): string =>
  digestOf([number, kind, subject, digest, previous]);

export const pricesDigest = (ticker: string, bytes: Uint8Array): string =>
  createHash('sha256').update(`${ticker}\n`).update(bytes).digest('hex');
