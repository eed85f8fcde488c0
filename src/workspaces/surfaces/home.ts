import { feedReply, stalenessInWords } from '../../present/compose/feed.ts';
import { type HomePage, subscriptionsPerPage } from '../../present/views/homePage.ts';
import { succeed } from '../../terms/result.ts';
import { type Asking, readerOf } from '../conversation.ts';
import type { Desk } from '../desk.ts';
import { listFor, makerOf } from '../subscriptions/managing.ts';

const mostRecent = 10;
/** Of so many newest askings those that the person may read here are shown. */
const mostLookedAt = 40;

const exampleLines = ['interval {} 60d', 'tail {} at 99%', 'shape {}', 'help'];

export type Home = (
  asker: Pick<Asking, 'place' | 'from'>,
  page: number,
  note: string | null,
) => Promise<HomePage>;

const nothingHere = 'Nothing is shown here.';

/** The home of somebody who is not answered: it tells nothing of the desk. */
const closed = (barred: string, timeZone: string): HomePage => ({
  barred,
  feed: '',
  stale: null,
  subscriptions: [],
  subscriptionCount: 0,
  page: 0,
  recent: [],
  troubles: [],
  examples: [],
  timeZone,
  note: null,
});

/** What one person sees at home: how the prices stand, what is posted for them, what they asked. */
export const createHome =
  (desk: Desk): Home =>
  async (asking, wanted, note) => {
    const asker = readerOf(asking);
    await desk.permissions.learn(asker);
    const here = desk.permissions.mayAsk(asker, 'help');
    if (!here.ok) return closed(here.silent ? nothingHere : here.message, desk.timeZone);
    const may = desk.permissions.mayAsk(asker, 'feed');
    const { team, owner } = makerOf(asker);
    const status = desk.feedStatus();
    const live = desk.snapshot();
    const made = desk.subscriptions === null ? succeed([]) : await listFor(desk, team, owner);
    const all = made.ok ? made.value : [];
    const lastPage = Math.max(0, Math.ceil(all.length / subscriptionsPerPage) - 1);
    const page = Math.min(Math.max(0, wanted), lastPage);
    const asked = await desk.records.store.conversations.askedBy(
      asker.from.team,
      asker.from.person ?? '',
      mostLookedAt,
    );
    const readable = (asked.ok ? asked.value : []).filter((line) => desk.permissions.mayRead(asker, line));
    const [ticker = 'KELP'] = live.ok ? live.value.tickers : [];
    return {
      barred: null,
      feed: may.ok ? feedReply(status, desk.timeZone).sentence : may.message,
      stale: may.ok ? stalenessInWords(status.freshness) : null,
      subscriptions: all.slice(page * subscriptionsPerPage, (page + 1) * subscriptionsPerPage),
      subscriptionCount: all.length,
      page,
      recent: readable.slice(0, mostRecent),
      troubles: [made, asked].flatMap((found) => (found.ok ? [] : [found.problem.message])),
      examples: exampleLines.map((line) => line.replace('{}', ticker)),
      timeZone: desk.timeZone,
      note,
    };
  };
