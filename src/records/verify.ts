import type { Kysely } from 'kysely';
import type { RecordExamination } from '../terms/records.ts';
import type { AnswerRow, AskingRow, ChainRow, Tables } from './database.ts';
import { emptyHead } from './internal/chain.ts';
import { answerDigest, askingDigest, entryHash } from './internal/digest.ts';
import { unpackPrices } from './internal/packing.ts';

const entriesAtOnce = 500;

/** Each kept price column against the digest that answers name it by. */
const priceFaults = async (db: Kysely<Tables>): Promise<readonly string[]> => {
  const digests = await db.selectFrom('price_columns').select('digest').execute();
  const faults: string[] = [];
  for (const { digest } of digests) {
    const row = await db
      .selectFrom('price_columns')
      .selectAll()
      .where('digest', '=', digest)
      .executeTakeFirstOrThrow();
    if (digestOfPacked(row.ticker, row.packed) !== digest)
      faults.push(`Prices of ${row.ticker} that answers rest on are not what was kept.`);
  }
  return faults;
};

const digestOfPacked = (ticker: string, packed: Uint8Array): string | null => {
  try {
    return unpackPrices(ticker, packed).digest;
  } catch {
    return null; // bytes that cannot be unpacked are not what was kept
  }
};

const digestOfAnswer = async (db: Kysely<Tables>, row: AnswerRow): Promise<string> => {
  const ids = await db
    .selectFrom('answer_ids')
    .select('id')
    .where('answer_id', '=', row.id)
    .orderBy('place')
    .execute();
  const series = await db
    .selectFrom('answer_series')
    .selectAll()
    .where('answer_id', '=', row.id)
    .orderBy('place')
    .execute();
  return answerDigest(
    row,
    ids.map(({ id }) => id),
    series,
  );
};

/** The digest of what stands in the tables for an entry; null where nothing does. */
const digestNow = async (db: Kysely<Tables>, { kind, number }: ChainRow): Promise<string | null> => {
  if (kind === 'answer') {
    const row = await db.selectFrom('answers').selectAll().where('number', '=', number).executeTakeFirst();
    return row === undefined ? null : digestOfAnswer(db, row);
  }
  const row: AskingRow | undefined = await db
    .selectFrom('askings')
    .selectAll()
    .where('number', '=', number)
    .executeTakeFirst();
  return row === undefined ? null : askingDigest(row);
};

const nameOf = ({ kind, number, subject }: ChainRow): string =>
  kind === 'answer' ? `answer ${subject}` : `entry ${number} (a time that ${subject} was asked)`;

const contentFault = async (
  db: Kysely<Tables>,
  entry: ChainRow,
  deleted: ReadonlySet<string>,
): Promise<readonly string[]> => {
  if (entry.kind === 'deletion') return [];
  const now = await digestNow(db, entry);
  const gone = deleted.has(String(entry.number));
  if (now === null) return gone ? [] : [`The ${nameOf(entry)} is gone without a trace of its deletion.`];
  if (gone) return [`The ${nameOf(entry)} stands although it was deleted.`];
  return now === entry.digest ? [] : [`The ${nameOf(entry)} is not what was kept.`];
};

const deletedNumbers = async (db: Kysely<Tables>): Promise<ReadonlySet<string>> => {
  const rows = await db.selectFrom('chain').select('subject').where('kind', '=', 'deletion').execute();
  return new Set(rows.map(({ subject }) => subject));
};

type Walk = { readonly length: number; readonly hash: string; readonly faults: string[] };

const walkChain = async (db: Kysely<Tables>, deleted: ReadonlySet<string>): Promise<Walk> => {
  const faults: string[] = [];
  let [length, hash] = [0, emptyHead];
  for (;;) {
    const entries = await db
      .selectFrom('chain')
      .selectAll()
      .where('number', '>', length)
      .orderBy('number')
      .limit(entriesAtOnce)
      .execute();
    for (const entry of entries) {
      if (entry.number !== length + 1 || entry.previous !== hash || entryHash(entry) !== entry.hash)
        faults.push(`The chain is broken at entry ${entry.number}.`);
      faults.push(...(await contentFault(db, entry, deleted)));
      ({ number: length, hash } = entry);
    }
    if (entries.length < entriesAtOnce) return { length, hash, faults };
  }
};

const countOf = async (db: Kysely<Tables>, table: 'answers' | 'askings' | 'chain'): Promise<number> => {
  const { count } = await db
    .selectFrom(table)
    .select(({ fn }) => fn.countAll<number>().as('count'))
    .executeTakeFirstOrThrow();
  return Number(count);
};

const unvouched = async (db: Kysely<Tables>, table: 'answers' | 'askings'): Promise<readonly string[]> => {
  const rows = await db
    .selectFrom(table)
    .select('number')
    .where(({ not, exists, selectFrom }) =>
      not(
        exists(selectFrom('chain').select('chain.number').whereRef('chain.number', '=', `${table}.number`)),
      ),
    )
    .execute();
  return rows.map(({ number }) => `The entry ${number} of ${table} is not in the chain.`);
};

/** Examines every entry, what it vouches for, and that nothing stands in the tables that no entry vouches for. */
export const verify = async (db: Kysely<Tables>): Promise<RecordExamination> => {
  const deleted = await deletedNumbers(db);
  const walk = await walkChain(db, deleted);
  const head = await db.selectFrom('chain_head').selectAll().executeTakeFirstOrThrow();
  const cut = head.length !== walk.length || head.hash !== walk.hash;
  return {
    answers: await countOf(db, 'answers'),
    askings: await countOf(db, 'askings'),
    deletions: deleted.size,
    head: walk.hash,
    faults: [
      ...walk.faults,
      ...(cut ? [`The chain ends at entry ${walk.length}, and ${head.length} were written.`] : []),
      ...(await unvouched(db, 'answers')),
      ...(await unvouched(db, 'askings')),
      ...(await priceFaults(db)),
    ],
  };
};
