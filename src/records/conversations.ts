import type { LastAnswered, RecordLine, ThreadPlace } from '../terms/records.ts';
import type { Result } from '../terms/result.ts';
import type { Access, Database } from './connection.ts';
import { askingOf } from './internal/rows.ts';

/** What was asked in one thread, and by one person: another way to the askings than by id or ticker. */
export type ConversationStore = {
  /** What was answered in a thread, the newest first, at most so many. */
  readonly lastIn: (thread: ThreadPlace, most: number) => Promise<Result<readonly LastAnswered[]>>;
  /** What a person of a team asked, the newest first, at most so many. */
  readonly askedBy: (
    team: string | null,
    person: string,
    most: number,
  ) => Promise<Result<readonly RecordLine[]>>;
};

const newest = (db: Database, most: number) =>
  db
    .selectFrom('askings')
    .innerJoin('answers', 'answers.id', 'askings.answer_id')
    .selectAll('askings')
    .select(['answers.verb', 'answers.question'])
    .orderBy('asked_at_ms', 'desc')
    .orderBy('askings.number', 'desc')
    .limit(most);

/** `is` takes a null for a value where `=` never holds of one. */
const lastIn = async (
  db: Database,
  { team, channel, thread }: ThreadPlace,
  most: number,
): Promise<readonly LastAnswered[]> => {
  const inChannel = newest(db, most)
    .select('answers.body')
    // what was asked under an id that the channel had before was asked there too
    .where(({ or, eb, selectFrom }) =>
      or([
        eb('channel', '=', channel),
        eb('channel', 'in', selectFrom('channel_moves').select('from_id').where('to_id', '=', channel)),
      ]),
    )
    .where('team', team === null ? 'is' : '=', team);
  const rows = await (thread === null
    ? inChannel.where('thread', 'is', null)
    : inChannel.where(({ or, eb }) => or([eb('thread', '=', thread), eb('message', '=', thread)]))
  ).execute();
  return rows.map(({ verb, body, ...row }) => {
    const { askedAtMs, place, from } = askingOf(row);
    return { id: row.answer_id, verb, body, askedAtMs, place, from };
  });
};

const askedBy = async (
  db: Database,
  team: string | null,
  person: string,
  most: number,
): Promise<readonly RecordLine[]> => {
  const rows = await newest(db, most)
    .where('person', '=', person)
    .where('team', team === null ? 'is' : '=', team)
    .execute();
  return rows.map(({ verb, question, ...row }) => {
    const { askedAtMs, place, from } = askingOf(row);
    return { id: row.answer_id, verb, question, askedAtMs, place, from };
  });
};

export const conversationStore = ({ read }: Pick<Access, 'read'>): ConversationStore => ({
  lastIn: (thread, most) => read((db) => lastIn(db, thread, most)),
  askedBy: (team, person, most) => read((db) => askedBy(db, team, person, most)),
});
